import { expose } from 'comlink';
import { deskWork } from './deskWork';

expose(deskWork);
