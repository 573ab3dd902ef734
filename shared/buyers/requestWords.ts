import { METRIC, type UnitChoices } from '../units';
import { chosenLength } from './words';

type What = { name: string; locality?: string | null; heads: number | null; lengthTenthsMm: number | null };

const fishOf = ({ name, locality }: What): string => [name, locality].filter(Boolean).join(' ');

/** "6 × Tropheus moorii Ilangi, 5 cm or more", "Tropheus moorii Ilangi at 5 cm". */
export function askedWords(kind: 'fish' | 'notice', what: What, units: UnitChoices = METRIC): string {
  const { heads, lengthTenthsMm } = what;
  const length = lengthTenthsMm === null ? null : chosenLength(lengthTenthsMm, units);
  if (kind === 'fish') return `${heads ?? 1} × ${fishOf(what)}${length ? `, ${length} or more` : ''}`;
  return `${heads ? `${heads} × ` : ''}${fishOf(what)} at ${length ?? 'any size'}`;
}
