import { ARRIVALS, COLONIES, EXITS, FINDINGS, fishCode, fishKey } from './colonies';
import type { Ago, Key } from './shape';
import type { StrainCode } from './strains';

/** A fish with a life of its own in the fishroom, as far as the story needs it to be consistent. */
export type Life = {
  key: Key;
  code: string | null;
  strain: StrainCode | null;
  /** Day of birth where it is known: a fish without one came as an adult. */
  born: Ago | null;
  from: Ago;
  until: Ago | null;
  sexTold: 'male' | 'female' | 'unknown';
  homes: { on: Ago; colony: string | null; tank: string | null }[];
};

/** Fish taken out of a batch, as the broods tell it. */
export type HeldBack = {
  on: Ago;
  born: Ago | null;
  strain: StrainCode | null;
  stem: string;
  numbers: readonly number[];
  colony: string | null;
  tank: string | null;
};

const untilOf = (key: Key): Ago | null => EXITS[key]?.on ?? null;

function founders(): Life[] {
  return ARRIVALS.flatMap(({ strain, on, colony, tank, males, females, anonymousFemales }) => {
    const stem = colony ?? strain;
    const home = { on, colony, tank: tank ?? null };
    const life = (key: Key, code: string | null, sexTold: 'male' | 'female'): Life => ({
      key,
      code,
      strain,
      born: null,
      from: on,
      until: untilOf(key),
      sexTold,
      homes: [home],
    });
    return [
      ...males.map((n) => life(fishKey(stem, n), fishCode(stem, n), 'male')),
      ...females.map((n) => life(fishKey(stem, n), fishCode(stem, n), 'female')),
      ...Array.from({ length: anonymousFemales ?? 0 }, (_, i) => life(`fish:${stem}/f${i + 1}`, null, 'female')),
    ];
  });
}

const bred = ({ on, born, strain, stem, numbers, colony, tank }: HeldBack): Life[] =>
  numbers.map((n) => {
    const key = fishKey(stem, n);
    return {
      key,
      code: fishCode(stem, n),
      strain,
      born,
      from: on,
      until: untilOf(key),
      sexTold: 'unknown',
      homes: [{ on, colony, tank }],
    };
  });

export const livesOf = (heldBack: HeldBack[]): Life[] => [...founders(), ...heldBack.flatMap(bred)];

/** Tank of a colony on a day. */
export function tankOfColony(code: string, day: Ago): string | null {
  return COLONIES.find((colony) => colony.code === code)?.homes.findLast(({ on }) => on <= day)?.tank ?? null;
}

export function tankOf(life: Life, day: Ago): string | null {
  if (day < life.from || (life.until !== null && day >= life.until)) return null;
  const home = life.homes.findLast(({ on }) => on <= day);
  return home?.colony ? tankOfColony(home.colony, day) : (home?.tank ?? null);
}

/** The sex as it was recorded by a day. */
export function sexOn(life: Life, day: Ago): 'male' | 'female' | 'unknown' {
  const found = FINDINGS.filter((finding) => finding.fish === life.key && finding.kind === 'sex' && finding.on <= day)
    .sort((a, b) => a.on - b.on)
    .at(-1);
  return found?.kind === 'sex' ? found.sex : life.sexTold;
}

/** A fish of the fishroom's own counts as adult from here; the program's own proposals do the same. */
const ADULT_AFTER_DAYS = 180;
const isAdultOn = (life: Life, day: Ago): boolean => life.born === null || day - life.born >= ADULT_AFTER_DAYS;

const FORTNIGHT = 14;
/** What a male that was never seen dominant weighs, in days of dominance: sneaking happens (common practice, no source). */
const SNEAKER_DAYS = 1;

/** Days within a span on which the last fish of the tank to be called dominant was this one. */
function dominantDays(life: Life, rivals: Life[], from: Ago, until: Ago): number {
  let days = 0;
  for (let day = from; day <= until; day++) {
    const last = FINDINGS.filter(
      ({ kind, on, fish }) => kind === 'dominant' && on <= day && rivals.some(({ key }) => key === fish),
    )
      .sort((a, b) => a.on - b.on)
      .at(-1);
    if (last?.fish === life.key) days += 1;
  }
  return days;
}

/** Adult males and unsexed adults of the tank while she may have spawned, with shares by the days each was dominant. */
export function possibleSires(
  lives: Life[],
  tank: string,
  from: Ago,
  until: Ago,
): { fish: Life; weight: number; days: number }[] {
  const there = lives.filter((life) => {
    for (let day = from; day <= until; day++) if (tankOf(life, day) === tank) return isAdultOn(life, until);
    return false;
  });
  const males = there.filter((life) => sexOn(life, until) !== 'female');
  return males.map((fish) => {
    const days = dominantDays(
      fish,
      males.filter(({ strain }) => strain === fish.strain),
      from - FORTNIGHT,
      until,
    );
    return { fish, weight: days + SNEAKER_DAYS, days };
  });
}
