import { type Kysely, sql } from 'kysely';

/** What a member has sent to them of their day: a letter at an hour, a calendar to subscribe to. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    // of the fishroom's clock; null: no letter
    'alter table member add column letterHour integer check (letterHour between 0 and 23)',
    // the fishroom's day that was looked at last, whether or not there was something to write
    'alter table member add column letterOn text check (letterOn is date(letterOn))',
    // the address is worked out from the id and the installation's secret; the row itself holds only its hash
    'alter table member add column calendarId text',
    'alter table member add column calendarHash text',
    'create unique index calendarByHash on member (calendarHash) where calendarHash is not null',
    'create index memberWithLetter on member (letterHour) where letterHour is not null',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
