import type { Step } from './broods';
import { fishCode, fishKey } from './colonies';
import { sampleOf } from './growth';
import { numbersOf } from './holdTelling';
import type { Ago, Entry, Key, Recorded } from './shape';
import type { Begun } from './stories';
import type { Teller } from './telling';

/** A brood with the day its young came out of the mouth, or were found. */
export type Started = Begun & { started: Ago };

/** Heads of the batch after each step, by age; the split-off part and joined heads are kept apart. */
export function headsAt({ brood }: Started, joined: { age: number; heads: number } | null, age: number): number {
  if (!brood.opens) return 0;
  let heads = brood.opens.heads;
  let isJoined = false;
  const join = (upTo: number) => {
    if (joined && !isJoined && joined.age <= upTo) {
      heads += joined.heads;
      isJoined = true;
    }
  };
  for (const step of brood.steps.filter((one) => one.age <= age)) {
    join(step.age);
    heads = after(heads, step);
  }
  join(age);
  return heads;
}

function after(heads: number, step: Step): number {
  switch (step.kind) {
    case 'counted':
      return step.heads;
    case 'moved':
    case 'meant':
      return heads;
    case 'kept':
      return heads - step.numbers.length;
    default:
      return heads - step.heads;
  }
}

function contentOf(step: Step, handle: string, onDay: string): Entry {
  const note = step.note ?? null;
  const batchId = `batch:${handle}`;
  switch (step.kind) {
    case 'moved':
      return { kind: 'moved', thing: 'batch', id: batchId, toTankId: `tank:${step.tank}`, onDay, note };
    case 'counted':
      return { kind: 'headCounted', batchId, onDay, heads: step.heads, note };
    case 'lost':
      return { kind: 'headsLost', batchId, onDay, heads: step.heads, cause: step.cause, note };
    case 'culled':
      return { kind: 'headsCulled', batchId, onDay, heads: step.heads, note };
    case 'joined':
      return { kind: 'batchJoined', batchId, intoBatchId: `batch:${step.brood}`, onDay, heads: step.heads, note };
    case 'split':
      return {
        kind: 'batchSplit',
        batchId,
        newBatchId: `${batchId}/2`,
        toTankId: `tank:${step.tank}`,
        onDay,
        heads: step.heads,
        note,
      };
    case 'left':
      return { kind: 'headsLeft', batchId, onDay, how: step.how, heads: step.heads, note };
    case 'meant':
      return {
        kind: 'headsKept',
        reservationId: `reservation:${handle}`,
        broodId: `brood:${handle}`,
        batchId,
        onDay,
        heads: step.heads,
        note,
      };
    case 'kept': {
      const fish = step.numbers.map((n) => ({
        id: fishKey(step.stem, n),
        code: fishCode(step.stem, n),
        sex: 'unknown' as const,
      }));
      const home = { tankId: step.tank && `tank:${step.tank}`, colonyId: step.colony && `colony:${step.colony}` };
      return { kind: 'heldBack', batchId, onDay, fish, keptAs: step.colony ? 'breeder' : 'holdback', ...home, note };
    }
  }
}

/** The counts before the head count: a strip's one total is split when there is time, two days later. */
function earlyCounts(tell: Teller, { handle, born, started, brood }: Started): Recorded[] {
  const { opens, numbers } = brood;
  const told: Recorded[] = [];
  if (numbers.wrigglers === undefined && numbers.freeSwimming === undefined) {
    const alive = opens && opens.age !== 'atOnce' ? opens.heads : numbers.total - 1;
    const split = numbersOf({ wrigglers: alive, ...(alive < numbers.total ? { dead: numbers.total - alive } : {}) });
    const on = started + 2;
    told.push(
      tell.entry(on, handle, {
        kind: 'stageCount',
        broodId: `brood:${handle}`,
        onDay: tell.day(on),
        numbers: split,
        note: null,
      }),
    );
  }
  if (opens && opens.age !== 'atOnce') {
    const on = born + opens.age;
    told.push(
      tell.entry(on, handle, {
        kind: 'headsOpened',
        batchId: `batch:${handle}`,
        onDay: tell.day(on),
        heads: opens.heads,
        note: null,
      }),
    );
  }
  return told;
}

export function tellSteps(tell: Teller, started: Started): Recorded[] {
  const { handle, born, brood } = started;
  const steps = brood.steps.map((step): Recorded => {
    const on = born + step.age;
    const order: Key | undefined = step.kind === 'left' ? step.order : undefined;
    return tell.entry(on, handle, contentOf(step, handle, tell.day(on)), order ? { order } : {});
  });
  return [...earlyCounts(tell, started), ...steps];
}

/** Ages at which a brood is measured, closer together while it grows fast. Common practice, no source. */
const MEASURED_AT = [34, 58, 84, 116, 152, 196, 242, 292];
const MOST_MEASURED = 15;
/** Broods whose fish are also put on the scale from here on. */
const WEIGHED = new Set(['e3', 'm3', 's5', 'l4']);

/** Ages and sizes of the samples of a brood: once the fry swim free, while there are fish, and not in the last two days. */
export function samplesOf(
  started: Started,
  joined: { age: number; heads: number } | null,
): { age: number; count: number }[] {
  const { handle, born, brood } = started;
  if (!brood.opens) return [];
  const shift = handle.length + (handle.codePointAt(1) ?? 0) - 50;
  return MEASURED_AT.map((age) => age + (shift % 4))
    .filter((age) => born + age <= -3 && age > started.started - born + 6)
    .map((age) => ({ age, count: Math.min(MOST_MEASURED, headsAt(started, joined, age)) }))
    .filter(({ count }) => count > 0);
}

export function tellSamples(tell: Teller, started: Started, joined: { age: number; heads: number } | null): Recorded[] {
  const { handle, strain, born } = started;
  return samplesOf(started, joined).map(({ age, count }) => {
    const on = born + age;
    const weighed = WEIGHED.has(handle) && age > 80;
    return tell.entry(on, handle, {
      kind: 'lengthSampled',
      sampleId: `sample:${handle}-${age}`,
      of: { thing: 'batch', id: `batch:${handle}` },
      onDay: tell.day(on),
      measure: 'total',
      method: age < 70 ? 'box' : 'ruler',
      readings: sampleOf(strain, handle, { ageDays: age, count, weighed }),
      note: null,
    });
  });
}
