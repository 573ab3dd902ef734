import { headsAt, type Started } from './broodTelling';
import { tankOf } from './lives';
import { LIVES } from './parents';
import type { Ago } from './shape';
import type { Stocked } from './waterTelling';

type Joined = { age: number; heads: number } | null;
type Span = [Ago, Ago];

/** Where a batch was, from when to when; until its last fish left, or to yesterday. */
function batchSpans(started: Started, joined: Joined): { tank: string; span: Span }[] {
  const { born, brood } = started;
  const homes = [
    { on: started.started, tank: brood.tank },
    ...brood.steps.flatMap((step) => (step.kind === 'moved' ? [{ on: born + step.age, tank: step.tank }] : [])),
  ];
  const last = brood.steps.at(-1);
  const isGone = last !== undefined && headsAt(started, joined, last.age) === 0;
  const end = isGone && last ? born + last.age : -1;
  const split = brood.steps.flatMap((step) =>
    step.kind === 'split' ? [{ tank: step.tank, span: [born + step.age, -1] satisfies Span }] : [],
  );
  return [...homes.map(({ on, tank }, i) => ({ tank, span: [on, homes[i + 1]?.on ?? end] satisfies Span })), ...split];
}

/** Fish with a tank of their own, day by day. */
function lifeSpans(): { tank: string; span: Span }[] {
  return LIVES.flatMap((life) => {
    const tank = life.homes.find((home) => home.colony === null)?.tank;
    return tank && tankOf(life, life.from) ? [{ tank, span: [life.from, life.until ?? -1] satisfies Span }] : [];
  });
}

/** When each tank had fish in it, colonies aside, as spans that do not overlap. */
export function stockedSpans(broods: readonly Started[], joinedOf: (handle: string) => Joined): Stocked {
  const spans = [...broods.flatMap((brood) => batchSpans(brood, joinedOf(brood.handle))), ...lifeSpans()];
  const byTank = new Map<string, Span[]>();
  for (const { tank, span } of spans.sort((a, b) => a.span[0] - b.span[0])) {
    const known = byTank.get(tank) ?? [];
    const last = known.at(-1);
    if (last && span[0] <= last[1]) last[1] = Math.max(last[1], span[1]);
    else known.push([span[0], span[1]]);
    byTank.set(tank, known);
  }
  return byTank;
}
