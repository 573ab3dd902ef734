import { type BroodStory, firstDayOf, type HoldStory, lastDayOf } from './broods';
import { endOf } from './holdDays';
import { tankOfColony } from './lives';
import { parentageOf } from './parents';
import type { Ago, Recorded } from './shape';
import type { Teller } from './telling';

type Numbers = BroodStory['numbers'];

/** Counts as an entry carries them: what was not counted is null, not zero. */
export const numbersOf = (counted: Partial<Numbers>) => ({
  total: counted.total ?? null,
  eggs: counted.eggs ?? null,
  wrigglers: counted.wrigglers ?? null,
  freeSwimming: counted.freeSwimming ?? null,
  dead: counted.dead ?? null,
  deformed: counted.deformed ?? null,
});

/** A full mouth is seen the day after it can have been filled at the latest. */
const firstSeen = (spawn: HoldStory['spawn']): Ago => (typeof spawn === 'number' ? spawn : spawn[1]);

function begun(tell: Teller, hold: HoldStory): Recorded {
  const { handle, colony, dam, spawn, plan, note } = hold;
  const last = lastDayOf(spawn);
  const shared = {
    holdId: `hold:${handle}`,
    tankId: `tank:${tankOfColony(colony, last)}`,
    colonyId: `colony:${colony}`,
    holderId: dam,
    parentage: parentageOf(hold),
    plan,
    note: note ?? null,
  };
  return typeof spawn === 'number'
    ? tell.entry(spawn, handle, { kind: 'spawnSeen', onDay: tell.day(spawn), ...shared })
    : tell.entry(firstSeen(spawn), handle, {
        kind: 'holdingSeen',
        firstSeenOn: tell.day(firstSeen(spawn)),
        spawnEarliest: tell.day(firstDayOf(spawn)),
        spawnLatest: tell.day(last),
        ...shared,
      });
}

/** Entries of one hold, from the mouth seen full to how it ended. */
export function tellHold(tell: Teller, hold: HoldStory, code: (handle: string) => string): Recorded[] {
  const { handle, spawn, checks = [], end, brood, plan } = hold;
  const guards = hold.colony.startsWith('CATE');
  const looks = checks.map((age) => {
    const on = lastDayOf(spawn) + age;
    const seen = guards ? (age < 4 ? 'eggs' : 'wrigglers') : 'holding';
    return tell.entry(on, handle, {
      kind: 'holdCheck',
      holdId: `hold:${handle}`,
      onDay: tell.day(on),
      seen,
      note: null,
    });
  });
  const on = endOf(tell.today, hold);
  if (!end || on === null) return [begun(tell, hold), ...looks];
  const ended = tell.entry(on, handle, {
    kind: 'holdEnded',
    holdId: `hold:${handle}`,
    onDay: tell.day(on),
    outcome: end.how,
    brood: brood
      ? {
          broodId: `brood:${handle}`,
          batchId: `batch:${handle}`,
          code: code(handle),
          tankId: `tank:${brood.tank}`,
          numbers: numbersOf(brood.numbers),
          opening: brood.opens?.age === 'atOnce' ? brood.opens.heads : null,
        }
      : null,
    note:
      brood?.note ?? ('note' in end ? (end.note ?? null) : plan === 'strip' && !brood ? 'Nothing in the mouth' : null),
  });
  return [begun(tell, hold), ...looks, ended];
}
