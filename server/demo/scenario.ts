import { proposeBroodCode } from '../../shared/codes';
import { addDays, type Day } from '../../shared/days';
import { firstDayOf, lastDayOf } from './scenario/broods';
import { type Started, tellSamples, tellSteps } from './scenario/broodTelling';
import { tellCare, tellFish } from './scenario/fishTelling';
import { endOf } from './scenario/holdDays';
import { numbersOf, tellHold } from './scenario/holdTelling';
import { LISTINGS, ordersOn, requestsOn } from './scenario/orders';
import { parentageOf } from './scenario/parents';
import { BUYERS, MEMBERS, ROOM } from './scenario/people';
import { tellPhotos } from './scenario/photoTelling';
import type { Ago, Happening, Recorded, Scenario } from './scenario/shape';
import { stockedSpans } from './scenario/stocked';
import { FOUND, HOLDS, strainOfColony } from './scenario/stories';
import { lotsOn, STRAINS, strainsOn } from './scenario/strains';
import { TANKS } from './scenario/tanks';
import { tasksOn } from './scenario/tasks';
import { inOrder, type Teller, teller } from './scenario/telling';
import { tellWater } from './scenario/waterTelling';

/** All broods with the day they began, oldest first. */
function startedBroods(today: Day): Started[] {
  const held = HOLDS.flatMap((hold): Started[] => {
    const started = endOf(today, hold);
    if (!hold.brood || started === null) return [];
    const { handle, colony, brood, spawn } = hold;
    return [{ handle, colony, strain: strainOfColony(colony), born: lastDayOf(spawn), brood, started }];
  });
  const found = FOUND.map(({ handle, colony, brood, spawn, on }): Started => {
    return { handle, colony, strain: strainOfColony(colony), born: lastDayOf(spawn), brood, started: on };
  });
  return [...held, ...found].sort((a, b) => a.started - b.started);
}

/** Year and letter in the order in which the broods of a strain began. */
function broodCodes(today: Day, broods: Started[]): Map<string, string> {
  const codes = new Map<string, string>();
  for (const { handle, strain, started } of broods) {
    codes.set(handle, proposeBroodCode(STRAINS[strain].code, addDays(today, started), new Set(codes.values())));
  }
  return codes;
}

function tellFound(tell: Teller, codeOf: (handle: string) => string): Recorded[] {
  return FOUND.map((story) => {
    const { handle, colony, spawn, on, brood } = story;
    return tell.entry(on, handle, {
      kind: 'broodFound',
      broodId: `brood:${handle}`,
      batchId: `batch:${handle}`,
      code: codeOf(handle),
      strainId: `strain:${strainOfColony(colony)}`,
      start: 'guarded',
      onDay: tell.day(on),
      spawnEarliest: tell.day(firstDayOf(spawn)),
      spawnLatest: tell.day(lastDayOf(spawn)),
      parentage: parentageOf(story),
      tankId: `tank:${brood.tank}`,
      numbers: numbersOf(brood.numbers),
      opening: brood.opens?.heads ?? null,
      note: brood.note ?? null,
    });
  });
}

/** Heads that joined a brood's batch, with the age of that brood on the day. */
function joinedTo(broods: Started[]) {
  const joins = broods.flatMap(({ born, brood }) =>
    brood.steps.flatMap((step) =>
      step.kind === 'joined' ? [{ to: step.brood, on: born + step.age, heads: step.heads }] : [],
    ),
  );
  return (handle: string): { age: Ago; heads: number } | null => {
    const join = joins.find(({ to }) => to === handle);
    const into = broods.find((brood) => brood.handle === handle);
    return join && into ? { age: join.on - into.born, heads: join.heads } : null;
  };
}

/**
 * The demo fishroom: two years of an invented cellar, told so that it always ends today. The same day gives the same
 * scenario, to the last millimetre. It is data: whoever loads it gives ids to its keys and writes through the app's own
 * functions, in the order of `happenings`.
 */
export function demoScenario(today: Day): Scenario {
  const tell = teller(today);
  const broods = startedBroods(today);
  const codes = broodCodes(today, broods);
  const codeOf = (handle: string): string => codes.get(handle) ?? '';
  const joinedOf = joinedTo(broods);
  const happenings: Happening[] = [
    ...tellFish(tell),
    ...tellCare(tell),
    ...HOLDS.flatMap((hold) => tellHold(tell, hold, codeOf)),
    ...tellFound(tell, codeOf),
    ...broods.flatMap((brood) => [...tellSteps(tell, brood), ...tellSamples(tell, brood, joinedOf(brood.handle))]),
    ...tellWater(tell, stockedSpans(broods, joinedOf)),
    ...tellPhotos(tell, broods, joinedOf),
  ];
  return {
    today,
    room: ROOM,
    members: MEMBERS,
    strains: strainsOn(today),
    lots: lotsOn(today),
    tanks: TANKS,
    happenings: inOrder(happenings),
    tasks: tasksOn(today),
    buyers: BUYERS,
    listings: LISTINGS,
    orders: ordersOn(today),
    requests: requestsOn(today),
  };
}
