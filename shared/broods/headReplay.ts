import { BadValue, whole } from '../badValue';
import { isDay } from '../days';
import { HEAD_EFFECTS, HEAD_KINDS, type LedgerEntry } from './headEntry';

/**
 * One entry as it was played. `change` is what it did to the balance; `correction` is the part of it that no one recorded:
 * the difference found by a recount, or the heads an entry took beyond those on the books.
 */
export type HeadStep = { entry: LedgerEntry; change: number; balance: number; correction: number; short: number };

const KINDS: readonly string[] = HEAD_KINDS;

/** The entries that stand, in the order they happened: by day, then by the instant recorded, then by id. */
export function standingEntries(entries: LedgerEntry[]): LedgerEntry[] {
  const cancelled = cancelledBy(entries);
  return entries.filter((entry) => !entry.reverses && !cancelled.has(entry.id)).sort(byTime);
}

/** Which entries are undone, and by which entry. An undone undo counts for nothing. Throws `BadValue`. */
export function cancelledBy(entries: LedgerEntry[]): Map<string, LedgerEntry> {
  const ids = checkedIds(entries);
  const undoers = new Map<string, LedgerEntry[]>();
  for (const entry of entries.filter(({ reverses }) => reverses).sort(byTime)) {
    const target = entry.reverses ?? '';
    if (!ids.has(target)) throw new BadValue('Reversed entry', target, 'must be in the ledger');
    undoers.set(target, [...(undoers.get(target) ?? []), entry]);
  }
  const settled = new Map<string, LedgerEntry | null>();
  const undoerOf = (id: string, above: string[]): LedgerEntry | null => {
    if (above.includes(id)) throw new BadValue('Reversed entry', id, 'cannot undo itself');
    const known = settled.get(id);
    if (known !== undefined) return known;
    const found = undoers.get(id)?.find((undo) => !undoerOf(undo.id, [...above, id])) ?? null;
    settled.set(id, found);
    return found;
  };
  const cancelled = new Map<string, LedgerEntry>();
  for (const { id } of entries) {
    const undoer = undoerOf(id, []);
    if (undoer) cancelled.set(id, undoer);
  }
  return cancelled;
}

/** Plays entries that stand. The balance never falls below zero: what is missing is a correction and is named `short`. */
export function replay(standing: LedgerEntry[]): HeadStep[] {
  let balance = 0;
  return standing.map((entry) => {
    const before = balance;
    const effect = HEAD_EFFECTS[entry.kind];
    if (effect === 'seen') {
      balance = entry.heads;
      return { entry, change: balance - before, balance, correction: balance - before, short: 0 };
    }
    const short = effect === 'in' ? 0 : Math.max(0, entry.heads - before);
    balance = effect === 'in' ? before + entry.heads : before - entry.heads + short;
    return { entry, change: balance - before, balance, correction: short, short };
  });
}

export const byTime = (a: LedgerEntry, b: LedgerEntry): number =>
  compare(a.on, b.on) || Date.parse(a.at) - Date.parse(b.at) || compare(a.id, b.id);

const compare = (a: string, b: string) => (a < b ? -1 : Number(a > b));

function checkedIds(entries: LedgerEntry[]): Set<string> {
  const ids = new Set<string>();
  for (const { id, kind, on, at, heads } of entries) {
    if (ids.has(id)) throw new BadValue('Entry id', id, 'must be in the ledger once');
    if (!KINDS.includes(kind)) throw new BadValue('Kind of entry', kind, 'must be one the ledger knows');
    if (!isDay(on)) throw new BadValue('Day of entry', on, 'a date such as 2026-05-14 is needed');
    if (Number.isNaN(Date.parse(at))) throw new BadValue('Time of entry', at, 'an instant is needed');
    whole('Heads', heads);
    ids.add(id);
  }
  return ids;
}
