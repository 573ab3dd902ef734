import { finite, whole } from '../badValue';
import type { KinshipMatrix } from './kinshipMatrix';
import { isBarred, type PairingChoice, pairingChoice } from './pairingChoice';
import { searchGroup } from './pairingSearch';
import { startGroup } from './pairingStart';
import { PedigreeError, unknownId } from './pedigreeError';

/** `maxFryInbreeding` (0 to 1) binds every male with every female chosen: pairs cannot be kept apart in one tank. */
export type PairingRequest = {
  matrix: KinshipMatrix;
  males: string[];
  females: string[];
  chooseMales: number;
  chooseFemales: number;
  maxFryInbreeding?: number;
  /** Fish that must be in the group. */
  required?: string[];
};

export type PairingPlan = {
  males: string[];
  females: string[];
  /** Mean kinship of the young that the group would leave, each sex giving half; its fish alike within a sex. */
  meanKinship: number;
  geneDiversity: number;
  /** Every chosen male with every chosen female, lowest F of the fry first. */
  pairs: { male: string; female: string; fryInbreeding: number }[];
  /** Whether no better group exists; false when there were too many to be sure. */
  exact: boolean;
};

/** Steps of the exact search before it settles for the best group seen: about half a second. */
const MOST_STEPS = 60_000;

/**
 * Chooses the group whose young have the lowest mean kinship (Ballou & Lacy 1995), self-kinships included, so that rare
 * founders are kept. Of brood mates that are alike the first listed are taken. Throws a `PedigreeError`: `noGroupFits`
 * (too few fish, or no group within the limit), `noGroupFound` (none found before the search was ended), `bothSexes`,
 * `unknownId`; a `BadValue` for counts below 1 and a limit outside 0 to 1.
 */
export function planPairing(request: PairingRequest): PairingPlan {
  const { matrix } = request;
  const males = [...new Set(request.males)];
  const females = [...new Set(request.females)];
  const ids = [...males, ...females];
  const required = new Set(request.required ?? []);
  const limit = finite('maxFryInbreeding', request.maxFryInbreeding ?? 1, { min: 0, max: 1 });
  checkRequest(request, males, females, required);
  const { chooseMales, chooseFemales } = request;
  const counts = { maleCount: males.length, males: chooseMales, females: chooseFemales };
  const choice = pairingChoice(matrix, ids, { ...counts, limit, required });
  const { members, cost, exact } = bestGroup(choice, ids, limit);
  const chosen = firstOfAlike(choice, members);
  const chosenIds = (male: boolean) =>
    chosen.flatMap((fish) => (choice.isMale[fish] === male ? (ids[fish] ?? []) : []));
  const group = { males: chosenIds(true), females: chosenIds(false) };
  return { ...group, meanKinship: cost, geneDiversity: 1 - cost, pairs: pairsOf(matrix, group), exact };
}

/** The same group with the first listed of those that could be exchanged, in the order of the lists. */
function firstOfAlike({ alike, required }: PairingChoice, members: number[]): number[] {
  const free = alike.map((_, fish) => !required.includes(fish));
  const taken = members.map((member) => {
    if (required.includes(member)) return member;
    const fish = alike.findIndex((first, other) => first === alike[member] && free[other]);
    free[fish] = false;
    return fish;
  });
  return taken.sort((a, b) => a - b);
}

function bestGroup(choice: PairingChoice, ids: string[], limit: number) {
  const fits = `every pair's fry at or under F = ${limit}. Raise the limit, choose fewer fish, or use two tanks`;
  const required = choice.required.flatMap((fish) => ids[fish] ?? []);
  if (isBarred(choice, choice.required)) {
    throw new PedigreeError('noGroupFits', required, `${required.join(' and ')} together do not keep ${fits}`);
  }
  const { group, exact } = searchGroup(choice, startGroup(choice), MOST_STEPS);
  const asked = `${choice.males} males and ${choice.females} females`;
  if (group) return { ...group, exact };
  if (exact) throw new PedigreeError('noGroupFits', required, `No ${asked} keep ${fits}`);
  throw new PedigreeError('noGroupFound', required, `Among so many fish no ${asked} were found that keep ${fits}`);
}

function checkRequest(request: PairingRequest, males: string[], females: string[], required: Set<string>): void {
  const { matrix } = request;
  const sides = [
    { listed: males, choose: whole('chooseMales', request.chooseMales, 1), sex: 'males' },
    { listed: females, choose: whole('chooseFemales', request.chooseFemales, 1), sex: 'females' },
  ];
  const both = males.filter((id) => females.includes(id));
  if (both.length > 0) {
    throw new PedigreeError('bothSexes', both, `${both[0]} is listed as male and as female. Settle its sex first`);
  }
  const inTable = new Set(matrix.ids);
  for (const id of [...males, ...females]) if (!inTable.has(id)) throw unknownId(id, 'the kinship table');
  for (const id of required)
    if (!males.includes(id) && !females.includes(id)) throw unknownId(id, 'the fish to choose from');
  for (const { listed, choose, sex } of sides) {
    const must = listed.filter((id) => required.has(id));
    if (listed.length >= choose && must.length <= choose) continue;
    const few = `${choose} ${sex} asked for, ${listed.length} to choose from`;
    const many = `${must.length} ${sex} required, ${choose} asked for`;
    throw new PedigreeError('noGroupFits', must, listed.length < choose ? few : many);
  }
}

function pairsOf(matrix: KinshipMatrix, group: { males: string[]; females: string[] }): PairingPlan['pairs'] {
  const pairs = group.males.flatMap((male) =>
    group.females.map((female) => ({ male, female, fryInbreeding: matrix.between(male, female) })),
  );
  return pairs.sort((a, b) => a.fryInbreeding - b.fryInbreeding);
}
