import BetterSqlite3 from 'better-sqlite3';
import { CompiledQuery, type DatabaseConnection, Kysely, Migrator, SqliteDialect, SqliteDriver, sql } from 'kysely';
import { migrations } from './migrations';
import type { Database } from './schema';

export type Db = Kysely<Database>;

/** Every statement is prepared once and kept, the oldest dropped: measured at a third of the cost of preparing anew. */
const STATEMENTS_KEPT = 500;

function keepStatements(raw: BetterSqlite3.Database): BetterSqlite3.Database {
  const kept = new Map<string, BetterSqlite3.Statement>();
  const prepare = raw.prepare.bind(raw);
  return new Proxy(raw, {
    get(target, key) {
      if (key !== 'prepare') {
        const value: unknown = Reflect.get(target, key, target);
        return typeof value === 'function' ? value.bind(target) : value;
      }
      return (text: string) => {
        const known = kept.get(text);
        if (known && !known.busy) return known;
        const made = prepare(text);
        kept.set(text, made);
        if (kept.size > STATEMENTS_KEPT) kept.delete(kept.keys().next().value ?? '');
        return made;
      };
    },
  });
}

/** A write transaction takes its lock at the start, so that it never fails half-way for want of it. */
class ImmediateDriver extends SqliteDriver {
  override async beginTransaction(connection: DatabaseConnection): Promise<void> {
    await connection.executeQuery(CompiledQuery.raw('begin immediate'));
  }
}

class ImmediateDialect extends SqliteDialect {
  readonly #raw: BetterSqlite3.Database;
  constructor(raw: BetterSqlite3.Database) {
    super({ database: raw });
    this.#raw = raw;
  }
  override createDriver() {
    return new ImmediateDriver({ database: this.#raw });
  }
}

function kyselyOn(raw: BetterSqlite3.Database): Db {
  raw.pragma('journal_mode = WAL');
  // Saved is saved: a commit is on the disk before it is answered.
  raw.pragma('synchronous = FULL');
  raw.pragma('busy_timeout = 5000');
  raw.pragma('foreign_keys = ON');
  if (raw.pragma('foreign_keys', { simple: true }) !== 1) throw new Error('This SQLite does not keep foreign keys');
  return new Kysely<Database>({ dialect: new ImmediateDialect(keepStatements(raw)) });
}

/** What SQLite knows of the tables' sizes; without it a join may walk the longer table first. Bounded, so that it is quick. */
export async function keepStatistics(db: Db): Promise<void> {
  await sql`pragma analysis_limit = 400`.execute(db);
  await sql`pragma optimize = 0x10002`.execute(db);
}

export const openFile = (file: string): Db => kyselyOn(new BetterSqlite3(file));

export const openMemory = (): Db => kyselyOn(new BetterSqlite3(':memory:'));

/** For worker threads: reads while the server writes, and cannot write. */
export function openForReading(file: string): Db {
  const raw = new BetterSqlite3(file, { readonly: true, fileMustExist: true });
  raw.pragma('busy_timeout = 5000');
  return new Kysely<Database>({ dialect: new SqliteDialect({ database: keepStatements(raw) }) });
}

export async function migrateToLatest(db: Db): Promise<string[]> {
  const migrator = new Migrator({ db, provider: { getMigrations: async () => migrations } });
  const { error, results } = await migrator.migrateToLatest();
  if (error) throw error;
  return (results ?? []).map((step) => step.migrationName);
}

/** 'ok', or what SQLite found wrong with the file. */
export async function integrityOf(db: Db): Promise<string> {
  const { rows } = await sql<{ integrity_check: string }>`pragma integrity_check`.execute(db);
  return rows.map((row) => row.integrity_check).join('; ');
}

/** Rows that refer to something that is not there. None, as long as foreign keys are kept. */
export async function brokenReferences(db: Db): Promise<{ table: string; to: string; count: number }[]> {
  const { rows } = await sql<{ table: string; to: string; count: number }>`
    select "table", parent as "to", count(*) as count from pragma_foreign_key_check() group by "table", parent
  `.execute(db);
  return rows;
}
