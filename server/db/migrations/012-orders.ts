import { type Kysely, sql } from 'kysely';

/** Receipts, what was given back of which payment, and fish that died on the way or came back. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    // The payment of which money is given back; of a payment that came too late or was wrong, the whole of it.
    'alter table payment add column refunds text',
    'alter table purchaseLine add column lostHeads integer not null default 0 check (lostHeads >= 0 and lostHeads <= heads)',
    'alter table purchaseLine add column returnedHeads integer not null default 0 check (returnedHeads >= 0 and returnedHeads <= heads)',
    // Frozen when the fish leave. It holds no name: that is read from the buyer, who may be erased.
    `create table receipt (
      roomId text not null,
      id text not null,
      purchaseId text not null,
      content text not null check (json_valid(content)),
      issuedOn text not null check (issuedOn is date(issuedOn)),
      createdAt text not null,
      primary key (roomId, id),
      unique (roomId, purchaseId),
      foreign key (roomId, purchaseId) references purchase (roomId, id)
    ) strict`,
    'create index purchaseByState on purchase (roomId, state)',
    'create index reservationOfLine on reservation (roomId, purchaseLineId)',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
