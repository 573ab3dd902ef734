import type { LossCause } from '../../../shared/broods/headEntry';
import type { Ago, Key } from './shape';

/** What happened to a brood after it began; ages in days from the spawn (the last possible day of it). */
export type Step = { age: number; note?: string } & (
  | { kind: 'moved'; tank: string }
  | { kind: 'counted'; heads: number }
  | { kind: 'lost'; heads: number; cause: LossCause }
  | { kind: 'culled'; heads: number }
  | { kind: 'joined'; brood: string; heads: number }
  | { kind: 'split'; tank: string; heads: number }
  | { kind: 'kept'; stem: string; numbers: readonly number[]; colony: string | null; tank: string | null }
  | { kind: 'left'; how: 'sold' | 'given' | 'traded' | 'auctioned'; heads: number; order?: Key }
  | { kind: 'meant'; heads: number }
);

/** How a hold went: spawn as one day when seen, else the first and last possible day. */
export type HoldStory = {
  handle: string;
  colony: string;
  /** Null: can't tell which. */
  dam: Key | null;
  spawn: Ago | readonly [Ago, Ago];
  /** The male that was seen, when the spawn was. */
  seenWith?: Key;
  plan: 'strip' | 'leave';
  checks?: readonly number[];
  note?: string;
  /** Open today when it has no end. `after`: days into the strip window, or past the expected release. */
  end?:
    | { how: 'stripped' | 'released'; after: number }
    | { how: 'swallowed' | 'lost' | 'diedHolding'; age: number; note?: string };
  brood?: BroodStory;
};

export type BroodStory = {
  tank: string;
  numbers: {
    total: number;
    eggs?: number;
    wrigglers?: number;
    freeSwimming?: number;
    dead?: number;
    deformed?: number;
  };
  /** Free-swimming at this age; at once when they were released; null while they are wrigglers still. */
  opens: { age: number | 'atOnce'; heads: number } | null;
  note?: string;
  steps: readonly Step[];
};

/** A brood without a hold on record: fry seen with their parents. */
export type FoundStory = Pick<HoldStory, 'handle' | 'colony' | 'dam' | 'spawn'> & { on: Ago; brood: BroodStory };

export const moved = (age: number, tank: string): Step => ({ age, kind: 'moved', tank });
export const counted = (age: number, heads: number, note?: string): Step => ({
  age,
  kind: 'counted',
  heads,
  ...(note ? { note } : {}),
});
export const lost = (age: number, heads: number, cause: LossCause, note?: string): Step => ({
  age,
  kind: 'lost',
  heads,
  cause,
  ...(note ? { note } : {}),
});
export const left = (
  age: number,
  how: 'sold' | 'given' | 'traded' | 'auctioned',
  heads: number,
  more: { order?: Key; note?: string } = {},
): Step => ({
  age,
  kind: 'left',
  how,
  heads,
  ...more,
});
export const kept = (
  age: number,
  stem: string,
  numbers: readonly number[],
  home: { colony?: string; tank?: string },
): Step => ({
  age,
  kind: 'kept',
  stem,
  numbers,
  colony: home.colony ?? null,
  tank: home.tank ?? null,
});

export const lastDayOf = (spawn: HoldStory['spawn']): Ago => (typeof spawn === 'number' ? spawn : spawn[1]);
export const firstDayOf = (spawn: HoldStory['spawn']): Ago => (typeof spawn === 'number' ? spawn : spawn[0]);
