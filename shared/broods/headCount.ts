import type { Day } from '../days';
import { HEAD_EFFECTS, type HeadKind, type LedgerEntry, type LossCause } from './headEntry';
import { byTime, cancelledBy, type HeadStep, replay, standingEntries } from './headReplay';

/** Fish were to leave alive that the ledger does not have. Deaths are never refused; this is for everything else. */
export class NotEnoughHeads extends Error {
  override readonly name = 'NotEnoughHeads';
  readonly entryId: string;
  readonly wanted: number;
  readonly there: number;

  constructor(entryId: string, wanted: number, there: number) {
    super(`${wanted} wanted, ${there} there`);
    this.entryId = entryId;
    this.wanted = wanted;
    this.there = there;
  }
}

/** Heads now and where they went. `lost` is deaths, without culls; `sold` is sales, whatever came back. */
export type HeadCount = {
  balance: number;
  opened: number;
  lost: number;
  sold: number;
  heldBack: number;
  corrections: number;
  series: { on: Day; balance: number }[];
};

/**
 * Replays a batch's head-count ledger. Heads are whole fish, days are civil dates. The order in which entries arrive does
 * not matter: they are played by day, then instant, then id, and reversed pairs cancel. A recount stores the heads seen;
 * its difference from the balance is a correction, worked out here, so that a loss recorded late does not falsify it.
 * balance = opened + moved in + returned + corrections - lost - culled - held back - moved out - sold - given - traded -
 * auctioned, and is never below zero. `series` holds the balance at the end of each day on which something happened.
 *
 * Throws `BadValue` for a bad entry, and `NotEnoughHeads` when more fish left alive than ever came in. When late deaths
 * make an earlier sale look too large, the difference is a correction instead: both did happen.
 */
export function headCount(entries: LedgerEntry[]): HeadCount {
  const { balance, opened, lost, sold, heldBack, corrections, series } = headCountOf(entries);
  return { balance, opened, lost, sold, heldBack, corrections, series };
}

/** One row of the ledger as it is shown: an undone entry keeps its place, struck, with the entry that undid it. */
export type HeadRow = { entry: LedgerEntry; undoneBy: LedgerEntry | null } & Omit<HeadStep, 'entry'>;

export type HeadCountInFull = HeadCount & {
  /** Heads by kind, undone entries left out; for recounts the number of counts is not a number of fish and is absent. */
  heads: Record<Exclude<HeadKind, 'recount'>, number>;
  lostBy: Record<LossCause, number>;
  /** First day of the ledger, and the day heads were last counted (opened or recounted); null while there is none. */
  openedOn: Day | null;
  countedOn: Day | null;
  /** Fish that left beyond those on the books: why corrections can be positive without a recount. */
  short: number;
  rows: HeadRow[];
};

/** `headCount` with what the screens show besides: losses by cause, every kind, dates, and rows with running balances. */
export function headCountOf(entries: LedgerEntry[]): HeadCountInFull {
  const standing = standingEntries(entries);
  refuseTheImpossible(standing);
  const steps = replay(standing);
  const heads = headsByKind(standing);
  return {
    balance: steps.at(-1)?.balance ?? 0,
    opened: heads.opening,
    lost: heads.loss,
    sold: heads.sold,
    heldBack: heads.heldBack,
    corrections: sum(steps.map((step) => step.correction)),
    series: endOfEachDay(steps),
    heads,
    lostBy: lossesByCause(standing),
    openedOn: standing[0]?.on ?? null,
    countedOn: standing.findLast(({ kind }) => kind === 'opening' || kind === 'recount')?.on ?? null,
    short: sum(steps.map((step) => step.short)),
    rows: rowsOf(entries, steps),
  };
}

/** The balance at the end of a day; 0 before the ledger opens. */
export function headsOn(entries: LedgerEntry[], day: Day): number {
  return headCount(entries).series.findLast(({ on }) => on <= day)?.balance ?? 0;
}

const sum = (numbers: number[]) => numbers.reduce((total, n) => total + n, 0);

/** More alive out than ever in, even if nothing had died or been missed: no late entry can explain that. */
function refuseTheImpossible(standing: LedgerEntry[]): void {
  let most = 0;
  for (const entry of standing) {
    const effect = HEAD_EFFECTS[entry.kind];
    if (effect === 'in') most += entry.heads;
    if (effect === 'seen') most = Math.max(most, entry.heads);
    if (effect !== 'leaves') continue;
    if (entry.heads > most) throw new NotEnoughHeads(entry.id, entry.heads, most);
    most -= entry.heads;
  }
}

function headsByKind(standing: LedgerEntry[]): HeadCountInFull['heads'] {
  const counts: Record<HeadKind, number> = {
    opening: 0,
    movedIn: 0,
    returned: 0,
    loss: 0,
    cull: 0,
    movedOut: 0,
    heldBack: 0,
    sold: 0,
    given: 0,
    traded: 0,
    auctioned: 0,
    recount: 0,
  };
  for (const { kind, heads } of standing) counts[kind] += heads;
  const { recount: _, ...heads } = counts;
  return heads;
}

function lossesByCause(standing: LedgerEntry[]): Record<LossCause, number> {
  const counts = { foundDead: 0, deformed: 0, jumped: 0, eaten: 0, equipment: 0, unknown: 0 };
  for (const { kind, heads, cause } of standing) if (kind === 'loss') counts[cause ?? 'unknown'] += heads;
  return counts;
}

function endOfEachDay(steps: HeadStep[]): HeadCount['series'] {
  return steps
    .filter((step, i) => steps[i + 1]?.entry.on !== step.entry.on)
    .map(({ entry, balance }) => ({ on: entry.on, balance }));
}

function rowsOf(entries: LedgerEntry[], steps: HeadStep[]): HeadRow[] {
  const undone = cancelledBy(entries);
  const played = new Map(steps.map((step) => [step.entry.id, step]));
  let balance = 0;
  return entries
    .filter(({ reverses }) => !reverses)
    .sort(byTime)
    .map((entry) => {
      const { change, correction, short, ...step } = played.get(entry.id) ?? { balance, ...NOTHING };
      balance = step.balance;
      return { entry, undoneBy: undone.get(entry.id) ?? null, change, balance, correction, short };
    });
}

const NOTHING = { change: 0, correction: 0, short: 0 };
