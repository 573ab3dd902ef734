import { finite } from '../badValue';
import type { SpeciesProfile } from '../species/profile';
import type { UnitChoices } from '../units';
import { METRIC } from '../units';
import { type Demands, waterDemands } from '../water/demands';
import { type Finding, loudestFirst } from '../water/finding';
import { companyFindings } from './company';
import { groupFindings } from './groups';
import { type Lodger, lodgersOf, type TankResident } from './resident';
import { volumeFindings } from './room';
import { heaterFindings } from './sharedWater';

export type StockingCheck = {
  findings: Finding[];
  heads: number;
  /** Weight of the fish in grams and per 100 litres, by the species' length-weight; null when a length is not known. */
  biomassG: number | null;
  gramsPer100L: number | null;
  demands: Demands;
};

/**
 * Judges who lives in a tank, or would after a move: volume, group size, females per male, whom fits in whose mouth, hybrids,
 * and whether one water suits all and the heater keeps it. Litres, °C, mm; every species needs its profile. Findings are
 * advice with reasons, loudest first, in the reader's units; an empty tank has none. Group, ratio and volume are the
 * profiles'; the mouth rule, crowding and hybrid warnings are common practice. Throws `BadValue` for bad figures.
 */
export function stockingCheck(
  tank: { litres: number; heaterC: number | null },
  residents: readonly TankResident[],
  profiles: readonly SpeciesProfile[],
  choices: UnitChoices = METRIC,
): StockingCheck {
  const litres = finite('Volume', tank.litres, { above: 0 });
  const lodgers = lodgersOf(residents, profiles).filter(({ heads }) => heads > 0);
  const demands = waterDemands([...new Set(lodgers.map(({ profile }) => profile))]);
  const biomassG = biomassOf(lodgers);
  return {
    findings: loudestFirst([
      ...companyFindings(lodgers),
      ...volumeFindings(litres, lodgers, choices),
      ...groupFindings(lodgers),
      ...heaterFindings(tank.heaterC, lodgers, demands, choices),
    ]),
    heads: lodgers.reduce((sum, { heads }) => sum + heads, 0),
    biomassG,
    gramsPer100L: biomassG === null ? null : (100 * biomassG) / litres,
    demands,
  };
}

function biomassOf(lodgers: readonly Lodger[]): number | null {
  let total = 0;
  for (const { heads, smallest, largest, profile } of lodgers) {
    if (smallest === null || largest === null) return null;
    const { a, b } = profile.lengthWeight.value;
    total += heads * a * ((smallest + largest) / 20) ** b;
  }
  return total;
}
