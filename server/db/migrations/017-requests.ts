import { type Kysely, sql } from 'kysely';

/** Requests are looked after by the link of their letter, and may wait for fish to come free. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    'alter table request add column tokenHash text',
    // Asked when too few were available: the visitor is told when they come free.
    'alter table request add column waitsForFish integer not null default 0 check (waitsForFish in (0, 1))',
    'create unique index requestByToken on request (tokenHash) where tokenHash is not null',
    'create index requestByState on request (roomId, state)',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
