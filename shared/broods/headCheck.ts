import { NotEnoughHeads } from './headCount';
import { HEAD_EFFECTS, type LedgerEntry } from './headEntry';
import { replay, standingEntries } from './headReplay';

/**
 * Asks whether an entry may be added to a ledger. Deaths and recounts always may. What leaves alive, and an undo of fish
 * that came in, may not when the fish are not there: on its own day, and on every later day that already has entries.
 * Throws `NotEnoughHeads` with the heads that could have been taken; `BadValue` for a bad entry.
 */
export function checkEntry(entries: LedgerEntry[], candidate: LedgerEntry): void {
  const wanted = candidate.reverses ? headsOf(entries, candidate.reverses) : candidate.heads;
  const missing = shortOf([...entries, candidate]) - shortOf(entries);
  const effect = HEAD_EFFECTS[candidate.kind];
  const mayGoShort = !candidate.reverses && (effect === 'death' || effect === 'seen');
  if (missing > 0 && !mayGoShort) throw new NotEnoughHeads(candidate.id, wanted, Math.max(0, wanted - missing));
}

const headsOf = (entries: LedgerEntry[], id: string) => entries.find((entry) => entry.id === id)?.heads ?? 0;

const shortOf = (entries: LedgerEntry[]) =>
  replay(standingEntries(entries)).reduce((total, step) => total + step.short, 0);
