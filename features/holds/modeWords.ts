import type { HoldRow } from '@/shared/holds/contract';
import type { HoldOutcome } from '@/shared/holds/entries';

type Mode = HoldRow['mode'];

/** What is seen, asked and recorded of a species, in its own words: she holds, he holds, or they guard. */
export type ModeWords = {
  carer: 'male' | 'female';
  seen: string;
  which: string;
  cannotTell: string;
  /** "2 already holding". */
  already: string;
  notYet: string;
  first: string;
  /** "22, day of this hold". */
  dayOf: string;
  /** A full mouth, or eggs on the rock. */
  thing: string;
  save: string;
  ends: Record<HoldOutcome, string>;
};

const HOLDS: ModeWords = {
  carer: 'female',
  seen: 'Holding seen',
  which: 'Which female?',
  cannotTell: 'Can’t tell which',
  already: 'already holding',
  notYet: 'Last seen not holding',
  first: 'First seen holding',
  dayOf: 'day of this hold',
  thing: 'hold',
  save: 'Save hold',
  ends: {
    stripped: 'Strip',
    released: 'Release',
    swallowed: 'Swallowed',
    lost: 'Lost',
    diedHolding: 'Died holding',
  },
};

const GUARDS: ModeWords = {
  ...HOLDS,
  seen: 'Guarding seen',
  which: 'Which female guards?',
  already: 'already guarding',
  notYet: 'Last seen without eggs',
  first: 'First seen guarding',
  dayOf: 'day since the spawn',
  thing: 'guarded brood',
  save: 'Save guarding',
  ends: { ...HOLDS.ends, released: 'Free-swimming', swallowed: 'Eaten', diedHolding: 'Female died' },
};

const HE_HOLDS: ModeWords = {
  ...HOLDS,
  carer: 'male',
  which: 'Which male?',
};

export function modeWords(mode: Mode): ModeWords {
  switch (mode) {
    case 'substrateSpawner':
      return GUARDS;
    case 'paternalMouthbrooder':
      return HE_HOLDS;
    default:
      return HOLDS;
  }
}
