import { type Kysely, sql } from 'kysely';

/** People, their sign-ins, and the one-time letters that prove an address. No fishroom here. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    `create table account (
      id text primary key,
      email text not null,
      emailFolded text not null unique,
      name text not null,
      passwordHash text,
      emailVerifiedAt text,
      disabledAt text,
      choices text not null default '{}' check (json_valid(choices)),
      totpSecret text,
      totpEnabledAt text,
      totpLastStep integer,
      createdAt text not null,
      version integer not null default 1
    ) strict`,
    `create table recoveryCode (
      accountId text not null references account (id) on delete cascade,
      codeHash text not null,
      usedAt text,
      primary key (accountId, codeHash)
    ) strict`,
    `create table session (
      id text primary key,
      accountId text not null references account (id) on delete cascade,
      createdAt text not null,
      lastSeenAt text not null,
      expiresAt text not null,
      endedAt text,
      device text not null,
      address text,
      secondStep text not null default 'notNeeded' check (secondStep in ('notNeeded', 'waiting', 'passed'))
    ) strict`,
    'create index sessionOfAccount on session (accountId)',
    `create table mailToken (
      id text primary key,
      purpose text not null check (purpose in ('verify', 'signIn', 'reset', 'changeEmail', 'buyer', 'unsubscribe')),
      accountId text references account (id) on delete cascade,
      email text not null,
      tokenHash text not null unique,
      payload text check (payload is null or json_valid(payload)),
      createdAt text not null,
      expiresAt text not null,
      usedAt text
    ) strict`,
    'create index mailTokenOfEmail on mailToken (email, purpose)',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
