import type { Figure } from '../species/figure';
import type { SpeciesProfile } from '../species/profile';
import type { Range } from '../species/species';
import { asNitrogen, asSubstance, degreesOf, type UnitChoices } from '../units';
import {
  formatAmmonia,
  formatHardness,
  formatNitrate,
  formatNitrite,
  formatPh,
  formatTemperature,
  formatTemperatures,
} from '../unitWords';
import { UNIONISED_LIMITS, unionisedAmmonia } from './ammonia';
import { type Finding, loudestFirst } from './finding';

/** A water test as stored; null where it was not measured. Nitrogen compounds in mg/L as N, hardness as CaCO3. */
export type WaterTest = {
  celsius: number | null;
  ph: number | null;
  ghCaCo3MgL: number | null;
  totalAmmoniaNMgL: number | null;
  nitriteNMgL: number | null;
  nitrateNMgL: number | null;
};

/** Limits in mg/L as N. Nitrite: working limits from memory. Nitrate: best under 25, at most 50 as NO3 (Dictionary of Ichthyology). */
export const NITRITE_LIMITS = { look: asNitrogen(0.1, 'NO2'), act: asNitrogen(0.5, 'NO2') };
export const NITRATE_LIMITS = { look: asNitrogen(25, 'NO3'), act: asNitrogen(50, 'NO3') };

/** Outside a range by more than this is a reason to act, not only to look. House rule. */
const FAR = { celsius: 1, ph: 0.3 };

/** First colour of the usual ammonia kits, in the kit's own unit: too pale to tell from none. Common practice, no source. */
const FIRST_COLOUR = 0.25;

/**
 * What is wrong with a water test for the most demanding of the species that live there, loudest first, in the reader's
 * units. Each finding says what it rests on; an empty list means nothing measured is outside a range. Total ammonia at the
 * kit's first colour asks for a second test instead of an alarm.
 */
export function waterFindings(
  test: WaterTest,
  profiles: readonly SpeciesProfile[],
  choices: UnitChoices,
  kit: { firstColour: number } = { firstColour: FIRST_COLOUR },
): Finding[] {
  const worst = (findings: (Finding & { by: number })[]): Finding[] =>
    findings
      .toSorted((a, b) => Number(b.level === 'act') - Number(a.level === 'act') || b.by - a.by)
      .slice(0, 1)
      .map(({ by: _, ...finding }) => finding);
  return loudestFirst([
    ...worst(profiles.flatMap((profile) => temperatureFinding(test.celsius, profile, choices))),
    ...worst(profiles.flatMap((profile) => phFinding(test.ph, profile))),
    ...worst(profiles.flatMap((profile) => hardnessFinding(test.ghCaCo3MgL, profile, choices))),
    ...ammoniaFindings(test, choices, kit.firstColour),
    ...limitFinding('nitrite', test.nitriteNMgL, NITRITE_LIMITS, (n) => formatNitrite(n, choices)),
    ...limitFinding('nitrate', test.nitrateNMgL, NITRATE_LIMITS, (n) => formatNitrate(n, choices)),
  ]);
}

/** Half the last digit that kits and thermometers show. */
const ROUNDING = 0.05;

/** How far outside a range: 0 within it, and within rounding of it. */
const outside = (value: number, [low, high]: Range) => {
  const by = Math.max(low - value, value - high, 0);
  return by < ROUNDING ? 0 : by;
};

const restsOn = ({ name }: SpeciesProfile, { source, note }: Figure<unknown>, range: string) =>
  `${name} wants ${range}. ${source}.${note ? ` ${note}` : ''}`;

function temperatureFinding(celsius: number | null, profile: SpeciesProfile, choices: UnitChoices) {
  if (celsius === null) return [];
  const { value: range } = profile.temperatureC;
  const by = outside(celsius, range);
  if (by === 0) return [];
  const says = `${formatTemperature(celsius, choices)} is too ${celsius < range[0] ? 'cold' : 'warm'} for ${profile.name}`;
  const because = restsOn(profile, profile.temperatureC, formatTemperatures(range, choices));
  return [
    { of: 'temperature' as const, level: by > FAR.celsius ? ('act' as const) : ('look' as const), says, because, by },
  ];
}

function phFinding(ph: number | null, profile: SpeciesProfile) {
  if (ph === null) return [];
  const { value: range } = profile.ph;
  const by = outside(ph, range);
  if (by === 0) return [];
  const borne = profile.phTolerated ? outside(ph, profile.phTolerated.value) === 0 : by <= FAR.ph + 1e-9;
  const says = `${formatPh(ph)} is too ${ph < range[0] ? 'low' : 'high'} for ${profile.name}`;
  const because = restsOn(profile, profile.ph, `pH ${range[0]} to ${range[1]}`);
  return [{ of: 'ph' as const, level: borne ? ('look' as const) : ('act' as const), says, because, by }];
}

function hardnessFinding(gh: number | null, profile: SpeciesProfile, choices: UnitChoices) {
  if (gh === null || !profile.hardnessDgh) return [];
  const { value: range } = profile.hardnessDgh;
  const by = outside(degreesOf(gh), range);
  if (by === 0) return [];
  const says = `${formatHardness(gh, 'GH', choices)} is too ${degreesOf(gh) < range[0] ? 'soft' : 'hard'} for ${profile.name}`;
  const because = restsOn(profile, profile.hardnessDgh, `${range[0]} to ${range[1]} dGH`);
  return [{ of: 'hardness' as const, level: 'look' as const, says, because, by }];
}

function ammoniaFindings(test: WaterTest, choices: UnitChoices, firstColour: number): Finding[] {
  const { totalAmmoniaNMgL: total, ph, celsius } = test;
  if (total === null || total === 0) return [];
  const shown = formatAmmonia(total, choices);
  if (ph === null || celsius === null) {
    const says = `Total ammonia ${shown}: measure pH and temperature too`;
    return [{ of: 'ammonia', level: 'look', says, because: 'How much of it is poisonous depends on both.' }];
  }
  const { mgL } = unionisedAmmonia({ totalAmmoniaNMgL: total, ph, celsius });
  const unionised = asSubstance(mgL, choices.ammoniaAs);
  const limit = asSubstance(UNIONISED_LIMITS.act, choices.ammoniaAs);
  const because =
    `Worked out from total ammonia ${shown}, ${formatPh(ph)}, ${formatTemperature(celsius, choices)} (Emerson et al. 1975). ` +
    `Above ${limit.toFixed(2)} mg/L it harms gills (IFAS FA-16).`;
  const isFaint = asSubstance(total, choices.ammoniaAs) <= firstColour * 1.001;
  const says = `Un-ionised ammonia ${unionised.toFixed(2)} mg/L as ${choices.ammoniaAs}. Limit ${limit.toFixed(2)}`;
  const faint = `Total ammonia at the kit’s first colour: test again before acting on it`;
  if (mgL < UNIONISED_LIMITS.look) return isFaint ? [{ of: 'retest', level: 'look', says: faint, because }] : [];
  if (isFaint) return [{ of: 'retest', level: 'look', says: `${faint}. ${says}`, because }];
  return [{ of: 'ammonia', level: mgL > UNIONISED_LIMITS.act ? 'act' : 'look', says, because }];
}

function limitFinding(
  of: 'nitrite' | 'nitrate',
  nitrogenMgL: number | null,
  { look, act }: { look: number; act: number },
  format: (nitrogenMgL: number) => string,
): Finding[] {
  if (nitrogenMgL === null || nitrogenMgL <= look * 1.001) return [];
  const because =
    of === 'nitrite'
      ? `Keep it under ${format(look)}; from ${format(act)} it is dangerous. Working limits, from memory.`
      : `Best under ${format(look)}, at most ${format(act)} (Dictionary of Ichthyology).`;
  const name = of === 'nitrite' ? 'Nitrite' : 'Nitrate';
  return [{ of, level: nitrogenMgL > act * 1.001 ? 'act' : 'look', says: `${name} ${format(nitrogenMgL)}`, because }];
}
