import { type Kysely, sql } from 'kysely';

/** Tasks that keep their weekday, and which task came back as which. */
export async function up(db: Kysely<unknown>): Promise<void> {
  const statements = [
    // 1 on Monday; null: the days count from when it was done
    'alter table task add column onWeekday integer check (onWeekday between 1 and 7)',
    // the settled task that this one is the next of
    'alter table task add column followsId text',
    'create unique index oneNextTask on task (roomId, followsId) where followsId is not null',
  ];
  for (const statement of statements) await sql.raw(statement).execute(db);
}
