import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { setRole } from '@/server/members/members';
import type { Scope } from '@/server/scope';
import { getMe, signUp } from '@/shared/accounts/contract';
import { listAudit } from '@/shared/audit/contract';
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
} from '@/shared/members/contract';
import { getRoom } from '@/shared/rooms/contract';
import {
  GOOD_PASSWORD,
  type Known,
  lettersTo,
  memberOf,
  ownerWithRoom,
  personWithAccount,
  tokenSentTo,
} from '../support/accounts';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
beforeAll(async () => {
  app = await testApp({ passwordCost: 10 });
});
afterAll(() => app.close());

let count = 0;
const freshEmail = () => `guest${++count}@mail.example`;
const rolesIn = async (person: Known, roomId: string) =>
  Object.fromEntries(
    (await person.get(listMembers, { params: { roomId } })).members.map(({ name, role }) => [name, role]),
  );

describe('inviting', () => {
  test('somebody without an account signs up from the letter, joins, and the address counts as confirmed', async () => {
    const { owner, roomId } = await ownerWithRoom(app, { name: 'Attic Racks' });
    const email = freshEmail();
    await owner.get(inviteMember, { params: { roomId }, body: { email: email.toUpperCase(), role: 'keeper' } });
    const [letter] = await lettersTo(app, email);
    expect(letter?.subject).toBe(`${owner.name} invites you to Attic Racks`);
    expect(letter?.text).toMatch(/Keeper\. Records everything in the room/);
    const token = await tokenSentTo(app, email);
    const guest = app.person();
    expect(await guest.get(readInvitation, { params: { token } })).toMatchObject({
      roomName: 'Attic Racks',
      role: 'keeper',
      invitedBy: owner.name,
      email,
      hasAccount: false,
    });
    await guest.get(signUp, { body: { name: 'Guest', email, password: GOOD_PASSWORD, invitation: token } });
    expect(await guest.get(joinByLink, { params: { token } })).toEqual({ roomId });
    const me = await guest.get(getMe);
    expect(me.account.emailVerified).toBe(true);
    expect(me.rooms).toEqual([expect.objectContaining({ id: roomId, role: 'keeper' })]);
    expect((await guest.ask(joinByLink, { params: { token } })).status).toBe(404);
    expect((await guest.ask(readInvitation, { params: { token } })).status).toBe(404);
  });

  test('somebody with an account sees it after signing in, and accepts or declines', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const guest = await personWithAccount(app);
    const other = await personWithAccount(app);
    for (const { email } of [guest, other])
      await owner.get(inviteMember, { params: { roomId }, body: { email, role: 'helper' } });
    const [open] = (await guest.get(getMe)).invitations;
    expect(open).toMatchObject({ roomName: 'Back Room', role: 'helper', invitedBy: owner.name });
    const [others] = (await other.get(getMe)).invitations;
    expect((await guest.ask(acceptInvitation, { params: { invitationId: others?.id } })).status).toBe(404);
    expect(await guest.get(acceptInvitation, { params: { invitationId: open?.id } })).toEqual({ roomId });
    await other.get(declineInvitation, { params: { invitationId: others?.id } });
    expect([(await guest.get(getMe)).invitations, (await other.get(getMe)).invitations]).toEqual([[], []]);
    expect(await rolesIn(owner, roomId)).toEqual({ [owner.name]: 'owner', [guest.name]: 'helper' });
  });

  test('an address that is only claimed, not confirmed, sees no invitation', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const squatter = await personWithAccount(app, { verified: false });
    const { id } = await owner.get(inviteMember, {
      params: { roomId },
      body: { email: squatter.email, role: 'owner' },
    });
    expect((await squatter.get(getMe)).invitations).toEqual([]);
    expect((await squatter.ask(acceptInvitation, { params: { invitationId: id } })).status).toBe(404);
  });

  test('it can be sent again, which kills the first link; withdrawn; and after a fortnight it is over', async () => {
    const own = await testApp();
    try {
      const { owner, roomId } = await ownerWithRoom(own);
      const email = freshEmail();
      const first = await owner.get(inviteMember, { params: { roomId }, body: { email, role: 'viewer' } });
      const firstToken = await tokenSentTo(own, email);
      await owner.get(resendInvitation, { params: { roomId, invitationId: first.id } });
      const token = await tokenSentTo(own, email);
      const guest = await personWithAccount(own);
      expect((await guest.ask(readInvitation, { params: { token: firstToken } })).status).toBe(404);
      expect((await guest.ask(readInvitation, { params: { token } })).status).toBe(200);
      own.later({ days: 14, minutes: 1 });
      expect((await guest.ask(joinByLink, { params: { token } })).status).toBe(404);
      const [open] = (await owner.get(listMembers, { params: { roomId } })).invitations;
      expect(open?.email).toBe(email);
      await owner.get(withdrawInvitation, { params: { roomId, invitationId: open?.id } });
      expect((await owner.get(listMembers, { params: { roomId } })).invitations).toEqual([]);
    } finally {
      await own.close();
    }
  });

  test('opening the link joins nobody; it takes a button', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const email = freshEmail();
    await owner.get(inviteMember, { params: { roomId }, body: { email, role: 'viewer' } });
    const token = await tokenSentTo(app, email);
    const guest = await personWithAccount(app);
    await guest.raw('GET', `/join/${token}`);
    await guest.raw('GET', `/api/invitations/${token}`);
    expect((await guest.get(getMe)).rooms).toEqual([]);
  });

  test('what cannot be invited: a member, an address invited already, by a stranger to their own address', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const keeper = await memberOf(app, roomId, 'keeper');
    const ask = (email: string) => owner.ask(inviteMember, { params: { roomId }, body: { email, role: 'viewer' } });
    expect((await ask(keeper.email)).status).toBe(409);
    const email = freshEmail();
    expect((await ask(email)).status).toBe(200);
    expect((await ask(email)).body.error?.fields?.['email']).toMatch(/Invited already/);
    const wrong = await owner.ask(inviteMember, { params: { roomId }, body: { email: 'no address', role: 'king' } });
    expect([wrong.status, Object.keys(wrong.body.error?.fields ?? {}).sort()]).toEqual([422, ['email', 'role']]);
    await app.house.db.updateTable('account').set({ emailVerifiedAt: null }).where('id', '=', owner.id).execute();
    expect((await ask(freshEmail())).body.error?.message).toMatch(/Confirm your own e-mail address first/);
  });

  test('a member who follows an invitation keeps the role they have', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const email = freshEmail();
    await owner.get(inviteMember, { params: { roomId }, body: { email, role: 'viewer' } });
    await owner.get(joinByLink, { params: { token: await tokenSentTo(app, email) } });
    expect(await rolesIn(owner, roomId)).toEqual({ [owner.name]: 'owner' });
  });
});

describe('roles', () => {
  test('S40 only an owner invites, changes roles or removes; a keeper may do none of it, least of all make an owner', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    for (const role of ['keeper', 'helper', 'viewer'] as const) {
      const member = await memberOf(app, roomId, role);
      const params = { roomId, accountId: owner.id };
      const body = { email: freshEmail(), role: 'owner' };
      const tries = [
        member.ask(inviteMember, { params: { roomId }, body }),
        member.ask(changeRole, { params: { roomId, accountId: member.id }, body: { role: 'owner', version: 1 } }),
        member.ask(removeMember, { params }),
      ];
      expect(
        (await Promise.all(tries)).map(({ status }) => status),
        role,
      ).toEqual([403, 403, 403]);
    }
    expect((await rolesIn(owner, roomId))[owner.name]).toBe('owner');
  });

  test('S40 the last owner cannot step down, be removed or leave', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    await memberOf(app, roomId, 'keeper');
    const params = { roomId, accountId: owner.id };
    const answers = [
      await owner.ask(changeRole, { params, body: { role: 'keeper', version: 1 } }),
      await owner.ask(removeMember, { params }),
      await owner.ask(leaveRoom, { params: { roomId } }),
    ];
    expect(answers.map(({ status }) => status)).toEqual([409, 409, 409]);
    expect(answers[0]?.body.error?.message).toBe('A fishroom needs an owner. Make somebody else an owner first.');
  });

  test('S40 nor can two owners who step down, leave or demote each other in the same moment', async () => {
    for (let round = 0; round < 8; round += 1) {
      const { owner, roomId } = await ownerWithRoom(app);
      const second = await memberOf(app, roomId, 'owner');
      const down = (who: Known, whom: Known) =>
        who.ask(changeRole, { params: { roomId, accountId: whom.id }, body: { role: 'viewer', version: 1 } });
      const moves = [
        () => [down(owner, owner), down(second, second)],
        () => [owner.ask(leaveRoom, { params: { roomId } }), second.ask(leaveRoom, { params: { roomId } })],
        () => [down(owner, second), down(second, owner)],
        () => [down(owner, owner), second.ask(leaveRoom, { params: { roomId } })],
      ];
      const answers = await Promise.all(moves[round % 4]?.() ?? []);
      expect(
        answers.filter(({ status }) => status === 200),
        `round ${round}`,
      ).toHaveLength(1);
      const owners = await app.house.db
        .selectFrom('member')
        .where('roomId', '=', roomId)
        .where('role', '=', 'owner')
        .selectAll()
        .execute();
      expect(owners, `round ${round}`).toHaveLength(1);
    }
  });

  test('S41 a request that was let in before its owner was demoted is refused when its turn to write comes', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const second = await memberOf(app, roomId, 'owner');
    const third = await memberOf(app, roomId, 'owner');
    const { house } = app;
    // What the second owner's request was given when it came in.
    const before: Omit<Scope, 'db'> = {
      house,
      now: house.clock.now().toISOString(),
      requestId: 'before',
      log: house.log,
      address: '',
      device: '',
      accountId: second.id,
      sessionId: second.id,
      roomId,
      actorId: second.id,
      role: 'owner',
      timeZone: 'Europe/Oslo',
      currency: 'EUR',
      today: '2026-05-14',
    };
    await owner.get(changeRole, { params: { roomId, accountId: second.id }, body: { role: 'viewer', version: 1 } });
    const late = house.db
      .transaction()
      .execute((db) => setRole({ ...before, db }, third.id, { role: 'viewer', version: 1 }));
    await expect(late).rejects.toMatchObject({ reason: 'forbidden' });
    expect((await rolesIn(owner, roomId))[third.name]).toBe('owner');
  });

  test('an owner whose account is closed does not count as one', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const second = await memberOf(app, roomId, 'owner');
    await app.house.db
      .updateTable('account')
      .set({ disabledAt: '2026-05-14T09:12:00.000Z' })
      .where('id', '=', second.id)
      .execute();
    expect((await owner.ask(leaveRoom, { params: { roomId } })).status).toBe(409);
  });

  test('of two changes to one role the later is shown the earlier', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const keeper = await memberOf(app, roomId, 'keeper');
    const params = { roomId, accountId: keeper.id };
    await owner.get(changeRole, { params, body: { role: 'helper', version: 1 } });
    const late = await owner.ask(changeRole, { params, body: { role: 'owner', version: 1 } });
    expect([late.status, late.body.error?.current]).toEqual([409, { role: 'helper', version: 2 }]);
  });

  test('who was removed, or left, finds no fishroom there any more', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const keeper = await memberOf(app, roomId, 'keeper');
    const viewer = await memberOf(app, roomId, 'viewer');
    const before = await keeper.ask(getRoom, { params: { roomId } });
    await owner.get(removeMember, { params: { roomId, accountId: keeper.id } });
    await viewer.get(leaveRoom, { params: { roomId } });
    for (const gone of [keeper, viewer]) expect((await gone.ask(getRoom, { params: { roomId } })).status).toBe(404);
    const cached = { 'if-none-match': before.headers.get('etag') ?? '' };
    expect((await keeper.raw('GET', `/api/rooms/${roomId}`, { headers: cached })).status).toBe(404);
    expect((await owner.ask(removeMember, { params: { roomId, accountId: keeper.id } })).status).toBe(404);
    expect(await rolesIn(owner, roomId)).toEqual({ [owner.name]: 'owner' });
  });
});

describe('who sees whom', () => {
  test('S37 members see names and roles; addresses and invitations only an owner', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const viewer = await memberOf(app, roomId, 'viewer');
    const email = freshEmail();
    await owner.get(inviteMember, { params: { roomId }, body: { email, role: 'helper' } });
    const { members, invitations } = await viewer.get(listMembers, { params: { roomId } });
    expect([members.map((member) => member.email), invitations]).toEqual([[null, null], []]);
    const full = await owner.get(listMembers, { params: { roomId } });
    expect(full.members.map((member) => member.email).sort()).toEqual([owner.email, viewer.email].sort());
    expect(full.invitations).toEqual([expect.objectContaining({ email, role: 'helper', letterFailed: false })]);
    expect(JSON.stringify(full)).not.toMatch(/hash|token|totp/i);
  });

  test('another fishroom’s owner finds nothing: no member, no invitation, no trail', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const other = await ownerWithRoom(app);
    const { id } = await owner.get(inviteMember, { params: { roomId }, body: { email: freshEmail(), role: 'helper' } });
    const statuses = await Promise.all([
      other.owner.ask(listMembers, { params: { roomId } }),
      other.owner.ask(changeRole, { params: { roomId, accountId: owner.id }, body: { role: 'viewer', version: 1 } }),
      other.owner.ask(withdrawInvitation, { params: { roomId, invitationId: id } }),
      other.owner.ask(withdrawInvitation, { params: { roomId: other.roomId, invitationId: id } }),
      other.owner.ask(resendInvitation, { params: { roomId: other.roomId, invitationId: id } }),
      other.owner.ask(removeMember, { params: { roomId: other.roomId, accountId: owner.id } }),
      other.owner.ask(listAudit, { params: { roomId } }),
      app.person().ask(listMembers, { params: { roomId } }),
    ]);
    expect(statuses.map(({ status }) => status)).toEqual([404, 404, 404, 404, 404, 404, 404, 401]);
    expect(statuses[0]?.body.error?.message).toBe('That was not found');
  });
});

describe('the trail', () => {
  test('tells who invited, joined, changed and removed, newest first, in pages; helpers do not see it', async () => {
    const { owner, roomId } = await ownerWithRoom(app);
    const helper = await memberOf(app, roomId, 'helper');
    const keeper = await memberOf(app, roomId, 'keeper');
    await owner.get(changeRole, { params: { roomId, accountId: helper.id }, body: { role: 'viewer', version: 1 } });
    await owner.get(removeMember, { params: { roomId, accountId: helper.id } });
    const { lines } = await keeper.get(listAudit, { params: { roomId } });
    expect(lines.map(({ action, about, by }) => [action, about, by?.name])).toEqual([
      ['removed', 'member', owner.name],
      ['changed', 'member', owner.name],
      ['made', 'fishroom', owner.name],
    ]);
    expect(lines[1]?.change).toEqual({ role: ['helper', 'viewer'] });
    const first = await keeper.get(listAudit, { params: { roomId }, query: { limit: '2' } });
    expect([first.lines.length, first.more]).toEqual([2, true]);
    const rest = await keeper.get(listAudit, { params: { roomId }, query: { before: first.lines[1]?.id } });
    expect([rest.lines.map(({ action }) => action), rest.more]).toEqual([['made'], false]);
    const viewer = await memberOf(app, roomId, 'viewer');
    expect((await viewer.ask(listAudit, { params: { roomId } })).status).toBe(403);
  });

  test('nobody rewrites it, not even the program', async () => {
    const { roomId } = await ownerWithRoom(app);
    const { db } = app.house;
    await expect(
      db.updateTable('audit').set({ action: 'nothing' }).where('roomId', '=', roomId).execute(),
    ).rejects.toThrow(/append-only/);
    await expect(db.deleteFrom('audit').where('roomId', '=', roomId).execute()).rejects.toThrow(/append-only/);
  });
});
