import { whole } from '../badValue';
import { inbreeding } from './inbreeding';
import type { PedigreeEntry } from './pedigree';
import { PedigreeError } from './pedigreeError';
import { assignedKinships, type PossibleAncestry, possibleAncestry } from './possibleAncestry';

/** Outcomes closer than this are one: they differ by rounding only. */
const SAME = 1e-12;

/** A table among this many takes 400 MB. */
const MOST_ANCESTORS = 10_000;

const tooManyAncestors = (id: string) =>
  new PedigreeError('tooLarge', [id], `${id} has too many possible ancestors to list what its F may be`);

/**
 * Every value that F of `id` takes over the uncertain draws among its possible ancestors, its own included, from low to
 * high, with the probability of each (they sum to 1; the mean is the expected F). An assignment settles every draw: one
 * candidate for each `oneOf` key, one pair for each `mixed` or `from` entry; listed one by one, weighted by the product of its
 * chances. `null` when there are more than `limit` assignments: then only the expected F can be given.
 * Throws a `PedigreeError` as `kinship` does, a `BadValue` for a limit that is not a whole number from 1.
 */
export function inbreedingOutcomes(
  pedigree: PedigreeEntry[],
  id: string,
  limit = 4_096,
): { f: number; probability: number }[] | null {
  whole('limit', limit, 1);
  const ancestry = possibleAncestry(pedigree, id);
  const draws = ancestry.options.flatMap((options, place) => (options.length > 1 ? [place] : []));
  const assignments = draws.reduce((count, place) => count * (ancestry.options[place]?.length ?? 1), 1);
  if (assignments > limit) return null;
  if (draws.length === 0) return [{ f: inbreeding(pedigree).get(id) ?? 0, probability: 1 }];
  if (ancestry.options.length > MOST_ANCESTORS) throw tooManyAncestors(id);
  return merged(everyOutcome(ancestry, draws));
}

/** Counts through the assignments with the youngest draw turning fastest, so that most steps change a few animals only. */
function everyOutcome(ancestry: PossibleAncestry, draws: number[]): { f: number; probability: number }[] {
  const { options } = ancestry;
  const kinships = assignedKinships(ancestry);
  const choice = options.map(() => 0);
  const found: { f: number; probability: number }[] = [];
  for (let changed: number | undefined = 0; changed !== undefined; changed = nextAssignment(choice, draws, options)) {
    const f = kinships.fOf(choice, changed);
    const probability = draws.reduce((product, place) => {
      return product * (options[place]?.[choice[place] ?? 0]?.weight ?? 0);
    }, 1);
    found.push({ f, probability });
  }
  return found;
}

/** Turns to the next assignment and tells the oldest place that changed; `undefined` after the last one. */
function nextAssignment(choice: number[], draws: number[], options: { length: number }[]): number | undefined {
  for (const place of draws.toReversed()) {
    const next = (choice[place] ?? 0) + 1;
    choice[place] = next < (options[place]?.length ?? 1) ? next : 0;
    if (choice[place] !== 0) return place;
  }
  return undefined;
}

function merged(outcomes: { f: number; probability: number }[]): { f: number; probability: number }[] {
  const distinct: { f: number; probability: number }[] = [];
  for (const { f, probability } of outcomes.sort((a, b) => a.f - b.f)) {
    const last = distinct.at(-1);
    if (last && f - last.f <= SAME) last.probability += probability;
    else distinct.push({ f, probability });
  }
  return distinct;
}
