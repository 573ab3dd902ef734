import { type Kysely, sql } from 'kysely';

/** Buyers, what is offered, orders, money. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    `create table buyer (
      roomId text not null references room (id) on delete cascade,
      id text not null,
      accountId text references account (id),
      name text not null,
      email text,
      phone text,
      address text,
      note text,
      emailConfirmedAt text,
      noticesStoppedAt text,
      erasedAt text,
      createdAt text not null,
      version integer not null default 1,
      primary key (roomId, id)
    ) strict`,
    'create unique index buyerByEmail on buyer (roomId, email) where email is not null',
    `create table listing (
      roomId text not null,
      id text not null,
      broodId text,
      colonyId text,
      listed integer not null default 0 check (listed in (0, 1)),
      -- [{ fromTenthsMm, cents }] by length class, rising
      classes text not null default '[]' check (json_valid(classes)),
      -- [{ lot: 'pair'|'trio'|'group'|'colony', heads, cents }]
      lots text not null default '[]' check (json_valid(lots)),
      note text,
      photoId text,
      version integer not null default 1,
      primary key (roomId, id),
      check ((broodId is not null) + (colonyId is not null) = 1),
      foreign key (roomId, broodId) references brood (roomId, id),
      foreign key (roomId, colonyId) references colony (roomId, id),
      foreign key (roomId, photoId) references photo (roomId, id)
    ) strict`,
    'create unique index oneListingPerBrood on listing (roomId, broodId) where broodId is not null',
    'create unique index oneListingPerColony on listing (roomId, colonyId) where colonyId is not null',
    // What visitors ask for: fish of a brood, or a notice when a strain reaches a length.
    `create table request (
      roomId text not null,
      id text not null,
      buyerId text not null,
      kind text not null check (kind in ('fish', 'notice')),
      broodId text,
      strainId text,
      heads integer check (heads > 0),
      lengthTenthsMm integer check (lengthTenthsMm > 0),
      words text,
      state text not null default 'unconfirmed' check (state in ('unconfirmed', 'waiting', 'notified', 'ordered', 'closed')),
      createdAt text not null,
      confirmedAt text,
      notifiedAt text,
      version integer not null default 1,
      primary key (roomId, id),
      check ((broodId is not null) + (strainId is not null) = 1),
      foreign key (roomId, buyerId) references buyer (roomId, id),
      foreign key (roomId, broodId) references brood (roomId, id),
      foreign key (roomId, strainId) references strain (roomId, id)
    ) strict`,
    `create table purchase (
      roomId text not null,
      id text not null,
      number integer not null check (number > 0),
      buyerId text not null,
      requestId text,
      state text not null check (state in ('requested', 'reserved', 'depositAsked', 'depositPaid', 'ready', 'collected', 'sent', 'closed', 'cancelled')),
      way text not null default 'sale' check (way in ('sale', 'gift', 'trade', 'auction')),
      discountCents integer not null default 0 check (discountCents >= 0),
      depositCents integer check (depositCents >= 0),
      note text,
      -- the buyer's link; stored as its hash
      tokenHash text not null unique,
      offeredTimes text not null default '[]' check (json_valid(offeredTimes)),
      agreedTime text,
      termsText text,
      cancelledBecause text,
      handedOverAt text,
      handedOverBy text references account (id),
      createdAt text not null,
      version integer not null default 1,
      primary key (roomId, id),
      unique (roomId, number),
      foreign key (roomId, buyerId) references buyer (roomId, id),
      foreign key (roomId, requestId) references request (roomId, id)
    ) strict`,
    'create index purchaseOfBuyer on purchase (roomId, buyerId)',
    `create table purchaseLine (
      roomId text not null,
      id text not null,
      purchaseId text not null,
      broodId text,
      fishId text,
      lot text not null default 'single' check (lot in ('single', 'pair', 'trio', 'group', 'colony')),
      heads integer not null check (heads > 0),
      -- the price of the whole line, set by the server
      cents integer not null check (cents >= 0),
      note text,
      primary key (roomId, id),
      check ((broodId is not null) + (fishId is not null) = 1),
      foreign key (roomId, purchaseId) references purchase (roomId, id),
      foreign key (roomId, broodId) references brood (roomId, id),
      foreign key (roomId, fishId) references fish (roomId, id)
    ) strict`,
    'create index lineOfPurchase on purchaseLine (roomId, purchaseId)',
    `create table message (
      roomId text not null,
      id text not null,
      purchaseId text not null,
      fromBuyer integer not null check (fromBuyer in (0, 1)),
      actorId text references account (id),
      body text not null,
      at text not null,
      readAt text,
      primary key (roomId, id),
      foreign key (roomId, purchaseId) references purchase (roomId, id)
    ) strict`,
    `create table payment (
      roomId text not null,
      id text not null,
      purchaseId text not null,
      kind text not null check (kind in ('deposit', 'balance', 'refund', 'lossCredit')),
      method text not null check (method in ('card', 'cash', 'transfer')),
      -- money received is above zero, money given back below
      cents integer not null check (cents <> 0),
      onDay text not null check (onDay is date(onDay)),
      at text not null,
      -- the payment at the card service, so that a repeated message books nothing twice
      outsideId text,
      needsRefund integer not null default 0 check (needsRefund in (0, 1)),
      note text,
      actorId text references account (id),
      primary key (roomId, id),
      foreign key (roomId, purchaseId) references purchase (roomId, id)
    ) strict`,
    'create unique index paymentOnce on payment (roomId, outsideId) where outsideId is not null',
    'create index paymentOfPurchase on payment (roomId, purchaseId)',
    `create trigger payment_no_update before update on payment begin select raise(abort, 'payments are append-only'); end`,
    `create trigger payment_no_delete before delete on payment
      when exists (select 1 from room where room.id = old.roomId)
      begin select raise(abort, 'payments are append-only'); end`,
    `create table checkout (
      roomId text not null,
      id text not null,
      purchaseId text not null,
      -- the session at the card service
      outsideId text not null unique,
      kind text not null check (kind in ('deposit', 'balance')),
      cents integer not null check (cents > 0),
      url text not null,
      state text not null check (state in ('open', 'paid', 'expired')),
      createdAt text not null,
      expiresAt text not null,
      primary key (roomId, id),
      foreign key (roomId, purchaseId) references purchase (roomId, id)
    ) strict`,
    `create table stripeEvent (
      id text primary key,
      type text not null,
      receivedAt text not null,
      outcome text not null
    ) strict`,
    // Letters wait here until the mail server has taken them.
    `create table letter (
      id text primary key,
      roomId text,
      kind text not null,
      toAddress text not null,
      toName text,
      subject text not null,
      bodyText text not null,
      bodyHtml text not null,
      attachments text not null default '[]' check (json_valid(attachments)),
      aboutId text,
      -- the one-time link in it is worked out from this id when it is sent: no token lies in the outbox
      tokenId text,
      -- where the reader can stop letters of this kind
      stopUrl text,
      state text not null default 'waiting' check (state in ('waiting', 'sent', 'failed')),
      attempts integer not null default 0,
      nextTryAt text not null,
      lastError text,
      createdAt text not null,
      sentAt text
    ) strict`,
    'create index letterWaiting on letter (state, nextTryAt)',
    'create index letterOfRoom on letter (roomId, state)',
    `create table job (
      id text primary key,
      roomId text,
      kind text not null,
      -- one job of a kind and key at a time
      jobKey text not null,
      payload text not null check (json_valid(payload)),
      runAt text not null,
      leasedUntil text,
      attempts integer not null default 0,
      lastError text,
      doneAt text,
      createdAt text not null
    ) strict`,
    'create unique index oneOpenJob on job (kind, jobKey) where doneAt is null',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
