import type { UnitChoices } from '../units';
import { formatTemperature, formatTemperatures } from '../unitWords';
import { type Demands, isDemand } from '../water/demands';
import type { Finding } from '../water/finding';
import type { Lodger } from './resident';

const NAMES = { temperatureC: 'temperature', ph: 'pH', hardnessDgh: 'hardness' } as const;
const OF = { temperatureC: 'temperature', ph: 'ph', hardnessDgh: 'hardness' } as const;

/** Whether one water suits all who live there, and whether the heater keeps it. */
export function heaterFindings(
  heaterC: number | null,
  lodgers: readonly Lodger[],
  demands: Demands,
  choices: UnitChoices,
): Finding[] {
  const names = [...new Set(lodgers.map(({ profile }) => profile.name))].join(', ');
  const clashes = (['temperatureC', 'ph', 'hardnessDgh'] as const).flatMap((key): Finding[] => {
    const demand = demands[key];
    if (isDemand(demand) || demand.none !== 'noOverlap') return [];
    return [
      {
        of: OF[key],
        level: 'act',
        says: `No ${NAMES[key]} suits all of ${names}`,
        because: 'Their ranges do not overlap.',
      },
    ];
  });
  return [...clashes, ...setPoint(heaterC, demands.temperatureC, choices)];
}

const ROUNDING = 0.05;

function setPoint(heaterC: number | null, demand: Demands['temperatureC'], choices: UnitChoices): Finding[] {
  if (heaterC === null || !isDemand(demand)) return [];
  const { low, high, lowFor, highFor } = demand;
  const isCold = heaterC < low - ROUNDING;
  if (!isCold && heaterC <= high + ROUNDING) return [];
  return [
    {
      of: 'temperature',
      level: 'look',
      says: `The heater’s ${formatTemperature(heaterC, choices)} is too ${isCold ? 'low' : 'high'} for ${isCold ? lowFor : highFor}`,
      because: `${formatTemperatures([low, high], choices)} suits all who live here.`,
    },
  ];
}
