import type { GaugeReading } from '@/components/ui/Gauge';
import type { Day } from '@/shared/days';
import type { SpeciesProfile } from '@/shared/species/profile';
import { asSubstance, degreesOf, fahrenheitOf, type UnitChoices } from '@/shared/units';
import { formatAmmonia, formatHardness, formatNitrate, formatNitrite, formatTemperature } from '@/shared/unitWords';
import type { WaterReading } from '@/shared/water/contract';
import { isDemand, waterDemands } from '@/shared/water/demands';
import { NITRATE_LIMITS, NITRITE_LIMITS, type WaterTest } from '@/shared/water/waterFindings';

type Name = keyof WaterTest | 'khCaCo3MgL' | 'conductivityUs';
export type LastReadings = Record<Name, number | null> & { on: Partial<Record<Name, Day>> };

const NAMES: readonly Name[] = [
  'celsius',
  'ph',
  'ghCaCo3MgL',
  'khCaCo3MgL',
  'totalAmmoniaNMgL',
  'nitriteNMgL',
  'nitrateNMgL',
  'conductivityUs',
];

/** A kit is rarely used whole: the last value of each, newest first, with its day. */
export function lastOfEach(readings: readonly WaterReading[]): LastReadings {
  const last = Object.fromEntries(NAMES.map((name) => [name, null])) as Record<Name, number | null>; // every name is there
  const on: LastReadings['on'] = {};
  for (const name of NAMES) {
    const found = readings.find((reading) => reading[name] !== null);
    if (!found) continue;
    last[name] = found[name];
    on[name] = found.onDay;
  }
  return { ...last, on };
}

export type Gauge = { name: string; value: string; unit: string; onDay: Day; reading?: GaugeReading; range?: string };

/** Each reading on its scale, with the range that the species share; in the reader's units. */
export function gaugesOf(last: LastReadings, profiles: readonly SpeciesProfile[], units: UnitChoices): Gauge[] {
  const demands = waterDemands(profiles);
  const degrees = (celsius: number) => (units.temperature === 'F' ? fahrenheitOf(celsius) : celsius);
  const hard = (caCo3: number) => (units.hardness === 'ppm' ? caCo3 : degreesOf(caCo3));
  const perDegree = units.hardness === 'ppm' ? 17.848 : 1;
  const { temperatureC, ph, hardnessDgh } = demands;
  const within = (name: string, from: number, to: number) => ({ range: `kept from ${name} ${from} to ${to}` });
  const one = (name: Name, make: (value: number) => Omit<Gauge, 'onDay'>): Gauge[] => {
    const [value, onDay] = [last[name], last.on[name]];
    return value === null || onDay === undefined ? [] : [{ ...make(value), onDay }];
  };
  return [
    ...one('celsius', (value) => ({
      name: 'Temperature',
      ...split(formatTemperature(value, units)),
      ...(isDemand(temperatureC)
        ? {
            reading: {
              at: degrees(value),
              ...scale(degrees(temperatureC.low), degrees(temperatureC.high)),
            },
            ...within('', degrees(temperatureC.low), degrees(temperatureC.high)),
          }
        : {}),
    })),
    ...one('ph', (value) => ({
      name: 'pH',
      value: value.toFixed(1),
      unit: '',
      ...(isDemand(ph) ? { reading: { at: value, ...scale(ph.low, ph.high) }, ...within('pH', ph.low, ph.high) } : {}),
    })),
    ...one('totalAmmoniaNMgL', (value) => ({ name: 'Total ammonia', ...split(formatAmmonia(value, units)) })),
    ...one('nitriteNMgL', (value) => {
      const as = (nitrogen: number) => asSubstance(nitrogen, units.nitriteAs);
      const { look, act } = NITRITE_LIMITS;
      return {
        name: 'Nitrite',
        ...split(formatNitrite(value, units)),
        reading: { at: as(value), least: 0, most: as(act) * 1.5, from: 0, to: as(look) },
      };
    }),
    ...one('nitrateNMgL', (value) => {
      const as = (nitrogen: number) => asSubstance(nitrogen, units.nitrateAs);
      const { look, act } = NITRATE_LIMITS;
      return {
        name: 'Nitrate',
        ...split(formatNitrate(value, units)),
        reading: { at: as(value), least: 0, most: as(act) * 1.5, from: 0, to: as(look) },
      };
    }),
    ...one('ghCaCo3MgL', (value) => ({
      name: 'General hardness',
      ...split(formatHardness(value, 'GH', units)),
      ...(isDemand(hardnessDgh)
        ? {
            reading: {
              at: hard(value),
              ...scale(hardnessDgh.low * perDegree, hardnessDgh.high * perDegree),
            },
          }
        : {}),
    })),
    ...one('khCaCo3MgL', (value) => ({ name: 'Carbonate hardness', ...split(formatHardness(value, 'KH', units)) })),
    ...one('conductivityUs', (value) => ({ name: 'Conductivity', value: String(Math.round(value)), unit: 'µS/cm' })),
  ];
}

/** The band takes the middle half of the line. */
function scale(from: number, to: number): Omit<GaugeReading, 'at'> {
  const span = Math.max(to - from, 0.5);
  return { least: from - span / 2, most: to + span / 2, from, to };
}

/** "26.0 °C" is a value and a unit. */
function split(text: string): { value: string; unit: string } {
  const [value = '', ...unit] = text.split(' ');
  return { value, unit: unit.join(' ') };
}
