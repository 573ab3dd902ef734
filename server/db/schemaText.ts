import { sql } from 'kysely';
import { migrateToLatest, openMemory } from './open';

const TYPES: Record<string, string> = { TEXT: 'string', INTEGER: 'number', REAL: 'number' };

/** The Kysely types of the schema as the migrations make it, read from SQLite itself. */
export async function schemaText(): Promise<string> {
  const db = openMemory();
  try {
    await migrateToLatest(db);
    const tables = await sql<{ name: string; sql: string }>`
      select name, sql from sqlite_master where type = 'table' and name not like 'sqlite_%' and name not like 'kysely_%' order by name
    `.execute(db);
    const parts: string[] = [];
    for (const table of tables.rows) parts.push(await tableText(db, table));
    const list = tables.rows.map(({ name }) => `  ${name}: ${typeName(name)};`).join('\n');
    return `${HEAD}\n${parts.join('\n\n')}\n\nexport type Database = {\n${list}\n};\n`;
  } finally {
    await db.destroy();
  }
}

const HEAD = `import type { Generated } from 'kysely';

// Made by \`npm run db:types\` from the migrations. Not edited by hand.
`;

const typeName = (table: string) => `${table[0]?.toUpperCase()}${table.slice(1)}Table`;

type Column = { name: string; type: string; notnull: number; dflt_value: string | null; pk: number };

async function tableText(db: ReturnType<typeof openMemory>, table: { name: string; sql: string }): Promise<string> {
  const columns = await sql<Column>`select * from pragma_table_info(${table.name})`.execute(db);
  const lines = columns.rows.map((column) => {
    const choices = new RegExp(`\\b${column.name} \\w+[^,\\n]*check \\(${column.name} in \\(([^)]*)\\)`).exec(
      table.sql,
    );
    const base =
      choices?.[1]
        ?.split(',')
        .map((word) => word.trim())
        .join(' | ') ??
      TYPES[column.type] ??
      'never';
    const full = column.notnull || column.pk ? base : `${base} | null`;
    return `  ${column.name}: ${column.dflt_value === null ? full : `Generated<${full}>`};`;
  });
  return `type ${typeName(table.name)} = {\n${lines.join('\n')}\n};`;
}
