/** Every way the number of heads in a batch changes. */
export const HEAD_KINDS = [
  'opening',
  'movedIn',
  'returned',
  'loss',
  'cull',
  'movedOut',
  'heldBack',
  'sold',
  'given',
  'traded',
  'auctioned',
  'recount',
] as const;
export type HeadKind = (typeof HEAD_KINDS)[number];

/** What a loss is put down to. */
export const LOSS_CAUSES = ['foundDead', 'deformed', 'jumped', 'eaten', 'equipment', 'unknown'] as const;
export type LossCause = (typeof LOSS_CAUSES)[number];

export const HEAD_KIND_WORDS: Record<HeadKind, string> = {
  opening: 'Free-swimming',
  movedIn: 'Moved in',
  returned: 'Returned',
  loss: 'Lost',
  cull: 'Culled',
  movedOut: 'Moved out',
  heldBack: 'Held back',
  sold: 'Sold',
  given: 'Given away',
  traded: 'Traded',
  auctioned: 'Auctioned',
  recount: 'Counted',
};

export const LOSS_CAUSE_WORDS: Record<LossCause, string> = {
  foundDead: 'Found dead',
  deformed: 'Deformed',
  jumped: 'Jumped',
  eaten: 'Eaten',
  equipment: 'Equipment',
  unknown: 'Cause not known',
};

/** What each kind does to the balance. A recount sets it to the heads seen. */
export const HEAD_EFFECTS = {
  opening: 'in',
  movedIn: 'in',
  returned: 'in',
  loss: 'death',
  cull: 'death',
  movedOut: 'leaves',
  heldBack: 'leaves',
  sold: 'leaves',
  given: 'leaves',
  traded: 'leaves',
  auctioned: 'leaves',
  recount: 'seen',
} as const satisfies Record<HeadKind, 'in' | 'death' | 'leaves' | 'seen'>;

/**
 * One line of a batch's ledger. `on` is the day it happened, `at` the instant it was recorded (UTC). `heads` is always the
 * number of fish: for a recount the heads seen, never the difference. An entry with `reverses` undoes the entry it names
 * and does nothing else; undoing that one restores the first.
 */
export type LedgerEntry = {
  id: string;
  on: string;
  at: string;
  kind: HeadKind;
  heads: number;
  cause?: LossCause | null;
  reverses?: string | null;
};
