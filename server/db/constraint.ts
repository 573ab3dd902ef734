import { Refusal } from '../../shared/refusal';

/** The database's "no" as ours, for what no rule translated before. The only place that reads SQLite's error codes. */
export function constraintRefusal(error: Error): Refusal | null {
  const code = 'code' in error ? String(error.code) : '';
  if (isUniqueViolation(error)) return new Refusal('conflict', 'Something like that is there already');
  if (code === 'SQLITE_CONSTRAINT_FOREIGNKEY')
    return new Refusal('invalid', 'Something that this refers to was not found');
  if (code === 'SQLITE_CONSTRAINT_CHECK') return new Refusal('invalid', 'Some of that needs another look');
  if (code === 'SQLITE_FULL') return new Refusal('full', 'The disk is full. Nothing was saved.');
  if (code === 'SQLITE_BUSY')
    return new Refusal('busy', 'Busy just now. Try again in a moment.', {}, { retryAfter: 2 });
  return null;
}

/** True when `error` says that a row with the same `column` (as in 'strain.code') is there already. */
export function isUniqueViolation(error: unknown, column?: string): boolean {
  if (!(error instanceof Error) || !('code' in error)) return false;
  const code = String(error.code);
  const unique = code === 'SQLITE_CONSTRAINT_UNIQUE' || code === 'SQLITE_CONSTRAINT_PRIMARYKEY';
  return unique && (column === undefined || error.message.includes(column));
}
