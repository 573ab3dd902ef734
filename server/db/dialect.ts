import { type RawBuilder, sql } from 'kysely';

/** What SQLite says differently from other engines is said here and nowhere else. */

/** The rows of a sub-select as one JSON array. */
export const jsonArray = <T>(expression: RawBuilder<T>): RawBuilder<string> =>
  sql<string>`json_group_array(${expression})`;

/** Text that begins with what was typed, its wildcards taken literally. */
export const beginsWith = (typed: string): string => `${typed.replace(/[\\%_]/g, '\\$&')}%`;

/** `column like pattern`, for patterns of `beginsWith`. */
export const like = (column: RawBuilder<unknown>, pattern: string) =>
  sql<boolean>`${column} like ${pattern} escape '\\'`;
