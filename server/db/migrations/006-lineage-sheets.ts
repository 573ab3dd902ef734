import { type Kysely, sql } from 'kysely';

/** Pairing plans, issued sheets, sheets taken in from elsewhere. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    `create table pairingPlan (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      name text not null,
      content text not null check (json_valid(content)),
      state text not null default 'draft' check (state in ('draft', 'carriedOut', 'dropped')),
      colonyId text,
      madeBy text not null references account (id),
      createdAt text not null,
      version integer not null default 1,
      primary key (roomId, id),
      foreign key (roomId, colonyId) references colony (roomId, id)
    ) strict`,
    `create table sheet (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      number integer not null check (number > 0),
      -- 128 bits, in the public address; not the number
      token text not null unique,
      fishId text,
      broodId text,
      purchaseLineId text,
      -- the exact signed bytes are in the JWS; this copy is for lists
      content text not null check (json_valid(content)),
      jws text not null,
      keyId text not null,
      issuedOn text not null check (issuedOn is date(issuedOn)),
      issuedBy text not null references account (id),
      createdAt text not null,
      replaces text,
      replacedAt text,
      withdrawnAt text,
      withdrawnBecause text,
      linkRevokedAt text,
      primary key (roomId, id),
      unique (roomId, number),
      check ((fishId is not null) + (broodId is not null) = 1),
      foreign key (roomId, fishId) references fish (roomId, id),
      foreign key (roomId, broodId) references brood (roomId, id),
      foreign key (roomId, purchaseLineId) references purchaseLine (roomId, id),
      foreign key (roomId, keyId) references roomKey (roomId, id),
      foreign key (roomId, replaces) references sheet (roomId, id)
    ) strict`,
    // A sheet of somebody else's, taken in. Its ancestors are foreign fish.
    `create table importedSheet (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      issuer text not null,
      number text not null,
      jws text not null,
      content text not null check (json_valid(content)),
      keyId text,
      signature text not null check (signature in ('valid', 'keyUnknown', 'bad')),
      importedBy text not null references account (id),
      createdAt text not null,
      entryId text,
      primary key (roomId, id),
      unique (roomId, issuer, number),
      foreign key (roomId, entryId) references entry (roomId, id)
    ) strict`,
    // An animal of another fishroom, named by its issuer, so that the same ancestor on two sheets is one animal.
    `create table foreignFish (
      roomId text not null references room (id) on delete cascade,
      issuer text not null,
      foreignId text not null,
      fishId text not null,
      importedSheetId text not null,
      primary key (roomId, issuer, foreignId),
      foreign key (roomId, fishId) references fish (roomId, id),
      foreign key (roomId, importedSheetId) references importedSheet (roomId, id)
    ) strict`,
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
