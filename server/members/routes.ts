import { DONE } from '../../shared/endpoint';
import {
  acceptInvitation,
  changeRole,
  declineInvitation,
  inviteMember,
  joinByLink,
  leaveRoom,
  listMembers,
  readInvitation,
  removeMember,
  resendInvitation,
  withdrawInvitation,
} from '../../shared/members/contract';
import { may } from '../../shared/roles';
import type { Serve } from '../http/serve';
import { invitationsOf, invite, sendAgain, withdraw } from './invitations';
import { acceptMine, declineMine, joinByToken, readByToken } from './joining';
import { membersOf, setRole, takeOut } from './members';

export function memberRoutes(serve: Serve): void {
  serve.read(listMembers, async (scope) => ({
    members: await membersOf(scope),
    invitations: may(scope.role, 'member:manage') ? await invitationsOf(scope) : [],
  }));
  serve.write(changeRole, async (scope, { params, body }) => {
    await setRole(scope, params.accountId, body);
    return DONE;
  });
  serve.write(removeMember, async (scope, { params }) => {
    await takeOut(scope, params.accountId);
    return DONE;
  });
  serve.write(leaveRoom, async (scope) => {
    await takeOut(scope, scope.actorId);
    return DONE;
  });
  serve.write(inviteMember, (scope, { body }) => invite(scope, body));
  serve.write(withdrawInvitation, async (scope, { params }) => {
    await withdraw(scope, params.invitationId);
    return DONE;
  });
  serve.write(resendInvitation, async (scope, { params }) => {
    await sendAgain(scope, params.invitationId);
    return DONE;
  });
  serve.open(readInvitation, (asked, { params }) => readByToken(asked, params.token));
  serve.signedIn(joinByLink, (asked, { params }) => joinByToken(asked, params.token));
  serve.signedIn(acceptInvitation, (asked, { params }) => acceptMine(asked, params.invitationId));
  serve.signedIn(declineInvitation, async (asked, { params }) => {
    await declineMine(asked, params.invitationId);
    return DONE;
  });
}
