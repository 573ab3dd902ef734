import type { UnitChoices } from '../units';
import { formatVolume } from '../unitWords';
import type { Finding } from '../water/finding';
import type { Lodger } from './resident';

/**
 * What a further adult is reckoned at, as a share of the litres per fish of the smallest group in the smallest tank. House
 * rule, set by the trade's figures for large Cyphotilapia: 473 L for six, 1060 L for fifteen.
 */
const SHARE_OF_A_FURTHER_FISH = 0.8;

/** The tank against the smallest that its species need, and against all of them together. */
export function volumeFindings(litres: number, lodgers: readonly Lodger[], choices: UnitChoices): Finding[] {
  const tooSmall = tooSmallFor(litres, lodgers, choices);
  return tooSmall.length > 0 ? tooSmall : crowding(litres, lodgers, choices);
}

function tooSmallFor(litres: number, lodgers: readonly Lodger[], choices: UnitChoices): Finding[] {
  const need = lodgers
    .filter(({ adults }) => adults >= 0.5)
    .flatMap(({ profile }) => (profile.minLitres ? [{ name: profile.name, figure: profile.minLitres }] : []))
    .toSorted((a, b) => b.figure.value - a.figure.value)[0];
  if (!need || litres >= need.figure.value * 0.99) return [];
  const { figure, name } = need;
  return [
    {
      of: 'volume',
      level: litres < figure.value / 2 ? 'act' : 'look',
      says: `${formatVolume(litres, choices)} is small for ${name}: ${formatVolume(figure.value, choices)} at least`,
      because: `${figure.source}.${figure.note ? ` ${figure.note}` : ''}`,
    },
  ];
}

function crowding(litres: number, lodgers: readonly Lodger[], choices: UnitChoices): Finding[] {
  const needed = lodgers.reduce((sum, { adults, profile: { minLitres, minGroup } }) => {
    const perFish = minLitres ? minLitres.value / minGroup.value : 0;
    return sum + adults * perFish * SHARE_OF_A_FURTHER_FISH;
  }, 0);
  if (needed <= litres) return [];
  const adults = Math.round(lodgers.reduce((sum, lodger) => sum + lodger.adults, 0));
  return [
    {
      of: 'crowding',
      level: 'look',
      says: `Crowded: as much fish as ${adults} adults in ${formatVolume(litres, choices)}`,
      because: `By the litres per fish of each species’ smallest group, about ${formatVolume(needed, choices)} would do. House rule.`,
    },
  ];
}
