import { type Kysely, sql } from 'kysely';

/** What came in from a spreadsheet: by what columns it was read, and every row that it made, so that it can be taken back. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await sql
    .raw(
      `create table dataImport (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      kind text not null check (kind in ('tanks', 'fish', 'colonies', 'holds', 'broods', 'counts', 'samples')),
      fileName text not null,
      -- the header words that each field was read from, remembered for the next file
      columns text not null check (json_valid(columns)),
      units text not null check (json_valid(units)),
      rows integer not null check (rows > 0),
      -- [{ table, id }] in the order of making
      made text not null check (json_valid(made)),
      actorId text not null references account (id),
      createdAt text not null,
      undoneAt text,
      primary key (roomId, id)
    ) strict`,
    )
    .execute(db);
}
