import { asNitrogen, caCo3Of } from '../../../shared/units';
import { between, chanceOf } from '../drawings/chance';
import { COLONY_ROUND, colonyDays } from './holdDays';
import type { Ago, Recorded } from './shape';
import { TANKS, waterOf } from './tanks';
import type { Teller } from './telling';
import { celsiusRead, testDays } from './temperatures';

const round = (value: number, step: number): number => Math.round(Math.round(value / step) * step * 1000) / 1000;

/** Usual readings: pH and degrees of hardness, within the ranges of all species kept in that water. */
const USUAL = {
  tanganyika: { ph: 8.5, gh: 13, kh: 12 },
  malawi: { ph: 8.1, gh: 12, kh: 8 },
} as const;

/** What the kits showed: ammonia and nitrite as the kit's first colours, nitrate in the kit's own steps. */
function testOf(tank: string, on: Ago, purpose: string) {
  const chance = chanceOf(`${tank} ${on} water`);
  const usual = USUAL[waterOf(tank)];
  // Fry are fed often in little water: now and then a nursery shows the first colour.
  const ammonia = purpose === 'nursery' && chance() < 0.12 ? 0.25 : 0;
  const young = purpose === 'growOut' || purpose === 'nursery';
  return {
    celsius: celsiusRead(tank, on),
    ph: round(between(chance, usual.ph - 0.12, usual.ph + 0.12) - (young ? 0.1 : 0), 0.1),
    ghCaCo3MgL: round(caCo3Of(Math.round(between(chance, usual.gh - 1, usual.gh + 1.4))), 0.1),
    khCaCo3MgL: round(caCo3Of(Math.round(between(chance, usual.kh - 1, usual.kh + 1.4))), 0.1),
    totalAmmoniaNMgL: round(asNitrogen(ammonia, 'NH4'), 0.001),
    nitriteNMgL: 0,
    nitrateNMgL: round(asNitrogen(Math.round(between(chance, young ? 5 : 8, 22)), 'NO3'), 0.001),
    conductivityUs: null,
  };
}

/** The last round found one nursery overfed. */
const OVERFED = { tank: 'N2', on: -2 } as const;

export type Stocked = ReadonlyMap<string, readonly (readonly [Ago, Ago])[]>;

const everyOf = (purpose: string): number =>
  purpose === 'colony' || purpose === 'display' ? COLONY_ROUND : purpose === 'growOut' ? 21 : 14;

function tests(tell: Teller, stocked: Stocked): Recorded[] {
  return TANKS.flatMap(({ code, purpose }) => {
    const spans = purpose === 'colony' && colonyDays(code).length > 0 ? colonyDays(code) : (stocked.get(code) ?? []);
    const days = testDays(code, spans, everyOf(purpose));
    const usual = days.filter((on) => code !== OVERFED.tank || on < OVERFED.on - 1);
    const told = usual.map((on) => ({ on, test: testOf(code, on, purpose), note: null }));
    const overfed = {
      on: OVERFED.on,
      test: {
        ...testOf(code, OVERFED.on, purpose),
        totalAmmoniaNMgL: round(asNitrogen(0.8, 'NH4'), 0.001),
        nitriteNMgL: round(asNitrogen(0.1, 'NO2'), 0.001),
      },
      note: 'Food left on the bottom. Drawn off, half the water changed, feeding halved.',
    };
    return (code === OVERFED.tank ? [...told, overfed] : told).map(({ on, test, note }) =>
      tell.entry(on, code, {
        kind: 'waterTested',
        tankId: `tank:${code}`,
        onDay: tell.day(on),
        ...test,
        asRead: {},
        note,
      }),
    );
  });
}

/** Changes are on record since the fishroom began to write them down, ten weeks ago. */
const SINCE = -70;

function changes(tell: Teller, stocked: Stocked): Recorded[] {
  return TANKS.flatMap(({ code, purpose }) => {
    const chance = chanceOf(`${code} changes`);
    const start = SINCE + Math.floor(between(chance, 0, 7));
    const days = Array.from({ length: 10 }, (_, i) => start + 7 * i + (chance() < 0.2 ? 1 : 0)).filter((on) => on < -1);
    const spans = [...colonyDays(code), ...(stocked.get(code) ?? [])];
    const there = (on: Ago) => spans.some(([from, until]) => from <= on && on <= until);
    return days.filter(there).map((on) =>
      tell.entry(on, code, {
        kind: 'waterChanged',
        tankId: `tank:${code}`,
        onDay: tell.day(on),
        percent: purpose === 'nursery' ? 40 : purpose === 'growOut' ? 35 : 30,
        note: null,
      }),
    );
  });
}

export const tellWater = (tell: Teller, stocked: Stocked): Recorded[] => [
  ...tests(tell, stocked),
  ...changes(tell, stocked),
];
