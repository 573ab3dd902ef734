import * as z from 'zod/mini';
import { Email, LinkToken } from '../accounts/shapes';
import { Done, endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { ROLES } from '../roles';
import { Version } from '../shapes';

const AnyRole = z.enum(ROLES, 'Choose a role');

export const MemberLine = z.strictObject({
  accountId: Id,
  name: z.string(),
  /** Only for those who manage members. */
  email: z.nullable(z.string()),
  role: AnyRole,
  joinedAt: z.string(),
  version: Version,
});
export type MemberLine = z.output<typeof MemberLine>;

export const InvitationLine = z.strictObject({
  id: Id,
  email: z.string(),
  role: AnyRole,
  invitedBy: z.string(),
  createdAt: z.string(),
  expiresAt: z.string(),
  /** The letter could not be delivered. */
  letterFailed: z.boolean(),
});
export type InvitationLine = z.output<typeof InvitationLine>;

/** Members, and for those who manage them the invitations that are still open. */
export const listMembers = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/members',
  needs: 'member:see',
  params: inRoom({}),
  output: z.strictObject({ members: z.array(MemberLine), invitations: z.array(InvitationLine) }),
});

export const changeRole = endpoint({
  method: 'PATCH',
  path: '/api/rooms/:roomId/members/:accountId',
  needs: 'member:manage',
  params: inRoom({ accountId: Id }),
  body: z.strictObject({ role: AnyRole, version: Version }),
  output: Done,
});

export const removeMember = endpoint({
  method: 'DELETE',
  path: '/api/rooms/:roomId/members/:accountId',
  needs: 'member:manage',
  params: inRoom({ accountId: Id }),
  output: Done,
});

export const leaveRoom = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/leave',
  needs: 'room:see',
  params: inRoom({}),
  output: Done,
});

export const Invite = z.strictObject({ email: Email, role: AnyRole });

export const inviteMember = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/invitations',
  needs: 'member:manage',
  params: inRoom({}),
  body: Invite,
  output: z.strictObject({ id: Id }),
});

export const withdrawInvitation = endpoint({
  method: 'DELETE',
  path: '/api/rooms/:roomId/invitations/:invitationId',
  needs: 'member:manage',
  params: inRoom({ invitationId: Id }),
  output: Done,
});

/** The same invitation in a new letter; the link of the earlier one is dead. */
export const resendInvitation = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/invitations/:invitationId/letter',
  needs: 'member:manage',
  params: inRoom({ invitationId: Id }),
  output: Done,
});

/** What the join page shows before anyone signs in. */
export const readInvitation = endpoint({
  method: 'GET',
  path: '/api/invitations/:token',
  needs: 'public',
  params: z.strictObject({ token: LinkToken }),
  output: z.strictObject({
    roomName: z.string(),
    role: AnyRole,
    invitedBy: z.string(),
    email: z.string(),
    hasAccount: z.boolean(),
    expiresAt: z.string(),
  }),
});

const Joined = z.strictObject({ roomId: Id });

/** The link is the proof: whoever is signed in joins. */
export const joinByLink = endpoint({
  method: 'POST',
  path: '/api/invitations/:token',
  needs: 'signedIn',
  params: z.strictObject({ token: LinkToken }),
  output: Joined,
});

/** For an invitation to one's own confirmed address, seen after signing in. */
export const acceptInvitation = endpoint({
  method: 'POST',
  path: '/api/me/invitations/:invitationId',
  needs: 'signedIn',
  params: z.strictObject({ invitationId: Id }),
  output: Joined,
});

export const declineInvitation = endpoint({
  method: 'DELETE',
  path: '/api/me/invitations/:invitationId',
  needs: 'signedIn',
  params: z.strictObject({ invitationId: Id }),
  output: Done,
});
