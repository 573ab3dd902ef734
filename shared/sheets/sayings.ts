import { ageWords, daysBetween, formatDate, formatShortDay } from '../days';
import type { Parentage } from '../lineage/pedigree';
import type { Generation } from './ancestry';
import type { SheetContent, SheetInbreeding } from './content';

/*
 * The words of a sheet's figures. A space inside a figure does not break, so that "79 %" stays on one line.
 */

/** No-break space. */
const NB = '\u00a0';
export const unbroken = (text: string): string => text.replaceAll(' ', NB);

/** "A", "A or B", "A, B or C". */
export const joinOr = (list: string[]): string =>
  list.length < 3 ? list.join(' or ') : `${list.slice(0, -1).join(', ')} or ${list.at(-1)}`;

/** "F2", "F1 or F2", "F1 to F4", "F1, one parent wild"; "F?" when a possible parent is of unknown origin. */
export function generationWords(generation: Generation): string {
  if (!generation) return 'F?';
  const { low, high, oneParentWild } = generation;
  const range = low === high ? `F${low}` : high === low + 1 ? `F${low} or F${high}` : `F${low} to F${high}`;
  return oneParentWild ? `${range}, one parent wild` : range;
}

/** A share in whole percent: "79 %", "under 1 %", "over 99 %" rather than a false 0 or 100. */
export function shareWords(share: number): string {
  const percent = Math.round(share * 100);
  if (share > 0 && percent === 0) return `under 1${NB}%`;
  if (share < 1 - 1e-9 && percent === 100) return `over 99${NB}%`;
  return `${percent}${NB}%`;
}

/** Zero as it is, everything else with three decimals. */
const coefficient = (f: number): string => (f === 0 ? '0' : f.toFixed(3));

const SHOWN_OUTCOMES = 4;

/** "0 at 79 %, 0.125 at 13 %, 0.250 at 8 %", likeliest first where there are too many to list. */
function outcomesWords(outcomes: NonNullable<SheetInbreeding['outcomes']>): string {
  const say = ({ f, probability }: (typeof outcomes)[number]) =>
    `${coefficient(f)}${NB}at${NB}${shareWords(probability)}`;
  if (outcomes.length <= SHOWN_OUTCOMES)
    return [...outcomes]
      .sort((a, b) => a.f - b.f)
      .map(say)
      .join(', ');
  const likeliest = [...outcomes].sort((a, b) => b.probability - a.probability).slice(0, SHOWN_OUTCOMES);
  const values = outcomes.map(({ f }) => f);
  const others = 1 - likeliest.reduce((sum, { probability }) => sum + probability, 0);
  const range = `${coefficient(Math.min(...values))} to ${coefficient(Math.max(...values))}`;
  return `${likeliest.map(say).join(', ')}, others${NB}at${NB}${shareWords(Math.max(0, others))}; all from ${range}`;
}

/** "F = 0.037" or "expected F = 0.037: 0 at 79 %, …". Not worked out, or worked out from nothing, is said as such. */
export function inbreedingWords(inbreeding: SheetInbreeding | null): string {
  if (!inbreeding) return 'not worked out';
  if (inbreeding.generationsKnown === 0) return 'not known: no parents are recorded';
  const figure = `F${NB}=${NB}${inbreeding.f.toFixed(3)}`;
  if (!inbreeding.outcomes) return `expected ${figure}; too many cases to list`;
  if (inbreeding.outcomes.length < 2) return figure;
  return `expected ${figure}: ${outcomesWords(inbreeding.outcomes)}`;
}

/** How far back the pedigree reaches, beside every F: "equal to 2.0 full generations". */
export function completenessWords(inbreeding: SheetInbreeding | null): string {
  const known = inbreeding?.generationsKnown ?? 0;
  if (known === 0) return 'no ancestors';
  return `equal to ${known.toFixed(1)} full generations`;
}

/** "9 Nov 2025", "Jun 2018", "2018", as far as the date is known. */
export function partialDayWords(day: string): string {
  if (day.length === 10) return unbroken(formatDate(day));
  if (day.length === 4) return day;
  return unbroken(formatDate(`${day}-01`).slice(2));
}

/** "9 Nov 2025", or "16 to 18 Oct 2025", as short as it can be said. */
export function daysWords(from: string, to: string): string {
  if (from === to) return formatDate(from);
  if (from.slice(0, 7) === to.slice(0, 7)) return `${Number(from.slice(8))} to ${formatDate(to)}`;
  return `${from.slice(0, 4) === to.slice(0, 4) ? formatShortDay(from) : formatDate(from)} to ${formatDate(to)}`;
}

/** Age on the day of issue, from the spawn: "8 months", "7 to 8 months" when the spawn lies in an interval. */
export function ageAtIssue(spawned: { from: string; to: string }, issuedOn: string): string | null {
  const [youngest, oldest] = [daysBetween(spawned.to, issuedOn), daysBetween(spawned.from, issuedOn)];
  if (youngest < 0) return null;
  const [low, high] = [ageWords(youngest), ageWords(oldest)];
  if (low === high) return low;
  const [number, ...unit] = low.split(' ');
  return high.endsWith(unit.join(' ')) && unit.length === 1 ? `${number} to ${high}` : `${low} to ${high}`;
}

const SEX_WORDS = {
  male: ['male', 'males'],
  female: ['female', 'females'],
  unsexed: ['not sexed', 'not sexed'],
} as const;
const SEXES = ['male', 'female', 'unsexed'] as const;

/** "6 of brood DUMA-26C, not sexed", "1 male and 3 females of brood DUMA-26C", "DUMA-A04, male". */
export function headsWords({ heads }: SheetContent['subject']): string {
  const there = SEXES.filter((sex) => heads[sex] > 0);
  const all = heads.male + heads.female + heads.unsexed;
  const only = there.length === 1 ? there[0] : undefined;
  if (only)
    return all === 1 ? SEX_WORDS[only][0] : `${all}, ${only === 'unsexed' ? 'not sexed' : `all ${SEX_WORDS[only][1]}`}`;
  const list = there.map((sex) => `${heads[sex]} ${SEX_WORDS[sex][heads[sex] === 1 ? 0 : 1]}`);
  return `${all}: ${list.slice(0, -1).join(', ')} and ${list.at(-1)}`;
}

/** What an uncertain parentage means for the young: one draw for all of them, or one each. */
export function drawWords(parentage: Parentage, role: 'sire' | 'dam'): string | null {
  if (parentage.kind === 'oneOf') return `One ${role} for all of them; which one is not certain.`;
  if (parentage.kind === 'mixed') return `Each of them may have another ${role}.`;
  return null;
}
