import type { Block } from '../print/flow';
import { paragraph } from '../print/lines';
import type { UnitChoices } from '../units';
import { formatConductivity, formatHardness, formatNitrate, formatPh, formatTemperature } from '../unitWords';
import type { Water, WaterReading } from './husbandry';
import { cells, plain, type Setting, TYPE } from './parts';
import { partialDayWords, unbroken } from './sayings';

const LABELS = {
  celsius: 'Temperature',
  ph: 'pH',
  kh: 'KH',
  gh: 'GH',
  nitrate: 'Nitrate',
  conductivity: 'Conductivity',
} as const;

const ORDER = ['celsius', 'ph', 'kh', 'gh', 'nitrate', 'conductivity'] as const;
const RANGE_MM = 24;

function sayReading(what: WaterReading['what'], value: number, units: UnitChoices): string {
  switch (what) {
    case 'celsius':
      return formatTemperature(value, units);
    case 'ph':
      return formatPh(value).replace('pH ', '');
    case 'kh':
      return formatHardness(value, 'KH', units);
    case 'gh':
      return formatHardness(value, 'GH', units);
    case 'nitrate':
      return formatNitrate(value, units);
    case 'conductivity':
      return formatConductivity(value);
  }
}

const numberIn = (text: string): string => text.split(' ')[0] ?? '';

/** Right side of the section's head: the months the readings span. */
export function waterSide({ from, to }: Water): string {
  const [first, last] = [partialDayWords(from.slice(0, 7)), partialDayWords(to.slice(0, 7))];
  return first === last ? `mean, ${first}` : `mean, ${first} to ${last}`;
}

/** Mean and range of each measure, as the fish lived in it. */
export function waterRows(water: Water, widthMm: number, setting: Setting, units: UnitChoices): Block[] {
  const row = { widthMm, heightMm: setting.rowMm - 0.4, sizeMm: TYPE.body, ruled: true };
  return ORDER.flatMap((what) => water.readings.filter((reading) => reading.what === what)).map(
    ({ what, mean, low, high }) => {
      const say = (value: number) => sayReading(what, value, units);
      const range = `${numberIn(say(low))} to ${numberIn(say(high))}`;
      const style = { sizeMm: TYPE.body, align: 'end' } as const;
      return cells(
        [
          { x: 0, text: paragraph(plain(LABELS[what]), 26, { sizeMm: TYPE.body }) },
          {
            x: widthMm - RANGE_MM,
            text: paragraph([{ text: unbroken(say(mean)), face: 'bold' }], widthMm - RANGE_MM - 22, style),
          },
          { x: widthMm, text: paragraph(plain(unbroken(range)), RANGE_MM - 2, { ...style, ink: 'ink2' }) },
        ],
        row,
      );
    },
  );
}
