import type { FigureName } from '@/shared/species/species';
import { celsiusOf, fahrenheitOf, LITRES_PER, TENTHS_MM_PER, type UnitChoices } from '@/shared/units';

/** A figure that a fishroom can set here, as one number or as two. */
export type EditableFigure = { name: FigureName; word: string; ends: 1 | 2; of: Measure };
type Measure = 'temperature' | 'volume' | 'length' | 'days' | 'count' | 'plain';

const figure = (name: FigureName, word: string, of: Measure, ends: 1 | 2 = 1): EditableFigure => ({
  name,
  word,
  ends,
  of,
});

export const EDITABLE: readonly EditableFigure[] = [
  figure('saleMm', 'Sold from', 'length'),
  figure('releaseMm', 'Young at release', 'length'),
  figure('temperatureC', 'Temperature', 'temperature', 2),
  figure('ph', 'pH', 'plain', 2),
  figure('hardnessDgh', 'Hardness', 'plain', 2),
  figure('minLitres', 'Least volume', 'volume'),
  figure('minGroup', 'Least group', 'count'),
  figure('femalesPerMale', 'Females per male', 'plain'),
  figure('holdDays', 'Days of holding', 'days'),
  figure('holdDaysRange', 'Days of holding, from and to', 'days', 2),
  figure('holdAtC', 'At', 'temperature'),
  figure('q10', 'Pace per 10 °C (Q10)', 'plain'),
  figure('hatchDay', 'Hatch on day', 'days'),
  figure('freeSwimmingDay', 'Free-swimming on day', 'days'),
  figure('stripDays', 'Strip on days', 'days', 2),
  figure('clutch', 'Clutch', 'count'),
  figure('clutchRange', 'Clutch, from and to', 'count', 2),
];

/** The unit that is typed, and the way to the stored one and back. */
export function measureOf(of: Measure, units: UnitChoices) {
  const same = (value: number) => value;
  switch (of) {
    case 'temperature':
      return units.temperature === 'F'
        ? { unit: '°F', store: celsiusOf, show: (value: number) => round(fahrenheitOf(value)) }
        : { unit: '°C', store: same, show: same };
    case 'volume':
      return {
        unit: { L: 'L', usGal: 'US gal', impGal: 'imp gal' }[units.volume],
        store: (value: number) => value * LITRES_PER[units.volume],
        show: (value: number) => round(value / LITRES_PER[units.volume]),
      };
    case 'length': {
      const perMm = TENTHS_MM_PER[units.length] / 10;
      return {
        unit: units.length,
        store: (value: number) => value * perMm,
        show: (value: number) => round(value / perMm),
      };
    }
    case 'days':
      return { unit: 'days', store: same, show: same };
    default:
      return { unit: '', store: same, show: same };
  }
}

const round = (value: number): number => Number(value.toFixed(2));
