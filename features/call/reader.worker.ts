import { expose } from 'comlink';
import { readKept, readLarge, takeRows } from './reading';

const reader = { readKept, readLarge, takeRows };
export type Reader = typeof reader;

expose(reader);
