import { changeRoom, createRoom, getRoom } from '../../shared/rooms/contract';
import type { Serve } from '../http/serve';
import { changeTheRoom, makeRoom, roomPage } from './rooms';

export function roomRoutes(serve: Serve): void {
  serve.signedIn(createRoom, (asked, { body }) => makeRoom(asked, body));
  serve.read(getRoom, (scope) => roomPage(scope));
  serve.write(changeRoom, (scope, { body }) => changeTheRoom(scope, body));
}
