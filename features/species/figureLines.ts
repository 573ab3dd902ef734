import type { SpeciesProfile } from '@/shared/species/profile';
import type { FigureName, Range } from '@/shared/species/species';
import type { UnitChoices } from '@/shared/units';
import { formatLength, formatTemperature, formatTemperatures, formatVolume } from '@/shared/unitWords';

export type FigureLine = { name: FigureName; word: string; value: string; source: string; standing: string };

const span = ([low, high]: Range, unit = ''): string => `${low} to ${high}${unit}`;
const mm = (value: number, units: UnitChoices): string => formatLength(value * 10, units);

/** Every figure of a species in words, with what it rests on; figures nobody knows say so. */
export function figureGroups(profile: SpeciesProfile, units: UnitChoices): { word: string; lines: FigureLine[] }[] {
  const line = <K extends FigureName>(
    name: K,
    word: string,
    say: (value: NonNullable<SpeciesProfile[K]>['value']) => string,
  ): FigureLine => {
    const figure = profile[name];
    if (!figure) return { name, word, value: 'Not known', source: '', standing: 'unknown' };
    // The figure of that very name.
    const value = figure.value as NonNullable<SpeciesProfile[K]>['value'];
    return { name, word, value: say(value), source: figure.source, standing: figure.standing };
  };
  const adult = ({ mm: length, type }: { mm: number; type: string | null }) =>
    `${mm(length, units)}${type ? ` ${type === 'TL' ? 'total' : 'standard'} length` : ''}`;
  return [
    {
      word: 'Size',
      lines: [
        line('adultMale', 'Male', adult),
        line('adultFemale', 'Female', adult),
        line('saleMm', 'Sold from', (value) => mm(value, units)),
        line('releaseMm', 'Young at release', (value) => mm(value, units)),
        line('lengthWeight', 'Weight by length', ({ a, b }) => `W = ${a} · L^${b} (g, cm)`),
      ],
    },
    {
      word: 'Water and company',
      lines: [
        line('temperatureC', 'Temperature', (value) => formatTemperatures(value, units)),
        line('ph', 'pH', (value) => span(value)),
        line('hardnessDgh', 'Hardness', (value) => span(value, ' dGH')),
        line('minLitres', 'Least volume', (value) => formatVolume(value, units)),
        line('minGroup', 'Least group', (value) => `${value} fish`),
        line('femalesPerMale', 'Females per male', String),
        line('temper', 'Temper', String),
        line('diet', 'Eats', String),
      ],
    },
    {
      word: 'Breeding',
      lines: [
        line('holdDays', 'Days of holding', (value) => `${value} days`),
        line('holdDaysRange', 'From, to', (value) => span(value, ' days')),
        line('holdAtC', 'At', (value) => formatTemperature(value, units)),
        line('q10', 'Pace per 10 °C (Q10)', String),
        line('hatchDay', 'Hatch on day', String),
        line('freeSwimmingDay', 'Free-swimming on day', String),
        line('stripDays', 'Strip on days', (value) => span(value)),
        line('clutch', 'Clutch', (value) => `${value} eggs`),
        line('clutchRange', 'Clutch, from to', (value) => span(value, ' eggs')),
        line('paternity', 'Fathers of a brood', ({ habit, says }) =>
          habit === null ? says : `${habit === 'single' ? 'One male' : 'Several males'}. ${says}`,
        ),
      ],
    },
    {
      word: 'Take care',
      lines: [line('crossesWith', 'Crosses with', String), line('checkLocally', 'Check where you live', String)],
    },
  ];
}
