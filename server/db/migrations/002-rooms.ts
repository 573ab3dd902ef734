import { type Kysely, sql } from 'kysely';

/** Fishrooms and who belongs to them. From here on every table's key begins with the fishroom. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    `create table room (
      id text primary key,
      name text not null,
      slug text not null unique,
      place text,
      timeZone text not null,
      currency text not null check (length(currency) = 3),
      settings text not null default '{}' check (json_valid(settings)),
      -- goes up with every write in the fishroom: the ETag of everything read from it
      changeNumber integer not null default 0,
      deleteAfter text,
      createdAt text not null,
      version integer not null default 1
    ) strict`,
    `create table member (
      roomId text not null references room (id) on delete cascade,
      accountId text not null references account (id),
      role text not null check (role in ('owner', 'keeper', 'helper', 'viewer')),
      joinedAt text not null,
      version integer not null default 1,
      primary key (roomId, accountId)
    ) strict`,
    'create index memberOfAccount on member (accountId)',
    `create table invitation (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      email text not null,
      role text not null check (role in ('owner', 'keeper', 'helper', 'viewer')),
      tokenHash text not null unique,
      invitedBy text not null references account (id),
      createdAt text not null,
      expiresAt text not null,
      acceptedAt text,
      withdrawnAt text,
      primary key (roomId, id)
    ) strict`,
    `create table roomKey (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      publicJwk text not null check (json_valid(publicJwk)),
      -- the private key, sealed with the installation's secret; null in a restored or imported archive
      sealedPrivateJwk text,
      createdAt text not null,
      retiredAt text,
      primary key (roomId, id)
    ) strict`,
    // Every write a keeper makes by Record, and every import, is one entry.
    `create table entry (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      kind text not null,
      content text not null check (json_valid(content)),
      contentHash text not null,
      actorId text not null references account (id),
      madeAt text not null,
      receivedAt text not null,
      -- the day it is about, in the fishroom's zone
      onDay text not null check (onDay is date(onDay)),
      -- what it is about: '<kind>:<id>' words, for the history of a page
      about text not null check (json_valid(about)),
      undoneAt text,
      undoneBy text references account (id),
      primary key (roomId, id)
    ) strict`,
    'create index entryByReceived on entry (roomId, receivedAt)',
    `create table entryAbout (
      roomId text not null,
      entryId text not null,
      thing text not null check (thing in ('tank', 'colony', 'fish', 'hold', 'brood', 'batch', 'strain')),
      thingId text not null,
      primary key (roomId, thing, thingId, entryId),
      foreign key (roomId, entryId) references entry (roomId, id) on delete cascade
    ) strict, without rowid`,
    `create table audit (
      id text primary key,
      roomId text,
      at text not null,
      actorId text,
      action text not null,
      about text not null,
      aboutId text,
      -- what changed, without names, addresses or letters: { field: [before, after] }
      change text check (change is null or json_valid(change)),
      requestId text
    ) strict`,
    'create index auditOfRoom on audit (roomId, at)',
    'create index auditOfThing on audit (roomId, aboutId)',
    `create trigger audit_no_update before update on audit begin select raise(abort, 'the audit trail is append-only'); end`,
    `create trigger audit_no_delete before delete on audit
      when exists (select 1 from room where room.id = old.roomId)
      begin select raise(abort, 'the audit trail is append-only'); end`,
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
