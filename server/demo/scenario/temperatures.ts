import { between, chanceOf } from '../drawings/chance';
import type { Ago } from './shape';
import { TANKS } from './tanks';

/** The heater of B3 failed on a cold weekend; its fish were moved on the third day. */
const FAILED = { tank: 'B3', from: -374, until: -335 } as const;
/** Today's trouble: a heater that sticks. */
const STUCK = { tank: 'G5', from: -4 } as const;

const setPointOf = (tank: string): number => TANKS.find(({ code }) => code === tank)?.heaterC ?? 25;

/** Summer warms a cellar by half a degree; one tank runs a little off its set point, always to the same side. */
function celsiusOn(tank: string, on: Ago): number {
  const own = between(chanceOf(`${tank} heater`), -0.15, 0.2);
  const season = 0.3 * Math.sin((2 * Math.PI * on) / 365);
  const noise = between(chanceOf(`${tank} ${on} celsius`), -0.2, 0.2);
  return setPointOf(tank) + own + season + noise;
}

/** What the thermometer showed, to a tenth. */
export function celsiusRead(tank: string, on: Ago): number {
  const usual = celsiusOn(tank, on);
  const failed = tank === FAILED.tank && on >= FAILED.from && on < FAILED.until;
  const stuck = tank === STUCK.tank && on >= STUCK.from;
  const celsius = failed ? Math.max(19.4, usual - 2.4 * (on - FAILED.from + 1)) : stuck ? usual + 3.1 : usual;
  return Math.round(celsius * 10) / 10;
}

/** Days on which a tank was tested: every `every` days within the days it was stocked, and on the days of trouble. */
export function testDays(tank: string, stocked: readonly (readonly [Ago, Ago])[], every: number): Ago[] {
  const offset = Math.floor(between(chanceOf(`${tank} round`), 0, every));
  const days = new Set<Ago>();
  for (const [from, until] of stocked) {
    days.add(from);
    for (let day = from; day <= until; day++) if ((day + 1000 * every + offset) % every === 0) days.add(day);
  }
  if (tank === FAILED.tank) for (const day of [FAILED.from + 1, FAILED.from + 2, FAILED.until + 2]) days.add(day);
  if (tank === STUCK.tank) days.add(STUCK.from + 3);
  return [...days].filter((day) => day < 0).sort((a, b) => a - b);
}
