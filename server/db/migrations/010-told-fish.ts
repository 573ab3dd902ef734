import { type Kysely, sql } from 'kysely';

/** What a sheet of somebody else's tells of each animal that it brought, and by which keys the sheet was checked. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    `alter table importedSheet add column keysFrom text check (keysFrom in ('here', 'address', 'pasted'))`,
    `create table toldFish (
      roomId text not null references room (id) on delete cascade,
      fishId text not null,
      importedSheetId text not null,
      -- 1: came in with the sheet and has a life here; 0: an ancestor that is known from it alone
      here integer not null check (here in (0, 1)),
      -- the animal as its sheet tells of it, parents by their names beyond the fishroom
      entry text not null check (json_valid(entry)),
      primary key (roomId, fishId),
      foreign key (roomId, fishId) references fish (roomId, id),
      foreign key (roomId, importedSheetId) references importedSheet (roomId, id)
    ) strict`,
    'create index toldFishOfSheet on toldFish (roomId, importedSheetId)',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
