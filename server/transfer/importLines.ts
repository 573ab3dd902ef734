import type * as z from 'zod/mini';
import { addColony } from '../../shared/colonies/contract';
import { addDays } from '../../shared/days';
import { fieldsOf } from '../../shared/fieldsOf';
import { addFish } from '../../shared/fish/contract';
import { EntryContent } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { addTank } from '../../shared/tanks/contract';
import type { ImportKind } from '../../shared/transfer/importFields';
import * as v from '../../shared/transfer/importValues';
import { startColony } from '../colonies';
import { newId } from '../db/newId';
import { addFounders } from '../fish';
import { keepEntry } from '../record';
import type { Scope } from '../scope';
import { addOne } from '../tanks';
import { batchOf, idOf, subjectOf } from './importSubjects';

export type Made = { table: 'entry' | 'tank' | 'fish' | 'colony'; id: string };

/** One line of the file: `read` reads a field by how it is meant, and puts what it finds unreadable beside that field. */
export type Line = {
  text: (field: string) => string | null;
  read: <T>(field: string, as: (text: string) => T) => T;
  maybe: <T>(field: string, as: (text: string) => T) => T | null;
  /** Counts under headers that are months or days. */
  counts: { day: string; heads: number }[];
  units: v.ImportUnits;
};

type Rule = (scope: Scope, line: Line) => Promise<Made[]>;

/** What one line of each kind becomes: by the same rules as if it had been typed in. */
export const LINES: Record<ImportKind, Rule> = {
  tanks: async (scope, line) => {
    const id = newId(scope.now);
    const body = checked(addTank.body, {
      id,
      code: line.read('code', String),
      place: line.text('place'),
      walkOrder: 0,
      lengthTenthsMm: null,
      widthTenthsMm: null,
      heightTenthsMm: null,
      fillTenthsMm: null,
      glassTenthsMm: null,
      standKg: null,
      litres: line.read('litres', (text) => v.litresIn(text, line.units)),
      heaterC: line.maybe('heater', (text) => v.celsiusIn(text, line.units)),
      purpose: 'display',
      note: line.text('note'),
    });
    await addOne(scope, body);
    return [{ table: 'tank', id }];
  },

  fish: async (scope, line) => {
    const id = newId(scope.now);
    const body = checked(addFish.body, {
      ids: [id],
      codes: [line.read('code', String)],
      strainId: await idOf(scope, line, 'strain'),
      sex: line.maybe('sex', v.sexIn) ?? 'unknown',
      keptAs: 'breeder',
      bornOn: line.maybe('born', v.dayIn),
      arrivedOn: line.maybe('arrived', v.dayIn),
      lotId: null,
      colonyId: line.text('colony') ? await idOf(scope, line, 'colony') : null,
      tankId: line.text('tank') ? await idOf(scope, line, 'tank') : null,
      mark: line.text('mark'),
      note: line.text('note'),
    });
    await addFounders(scope, body);
    return [{ table: 'fish', id }];
  },

  colonies: async (scope, line) => {
    const id = newId(scope.now);
    const body = checked(addColony.body, {
      id,
      code: line.read('code', String),
      strainId: await idOf(scope, line, 'strain'),
      startedOn: line.read('day', v.dayIn),
      note: line.text('note'),
      tankId: await idOf(scope, line, 'tank'),
      fishIds: [],
      newFish: { males: 0, females: 0, unsexed: 0, lotId: null, coded: false },
    });
    await startColony(scope, body);
    return [{ table: 'colony', id }];
  },

  holds: async (scope, line) => {
    const holdId = newId(scope.now);
    const seen = line.read('day', v.dayIn);
    const ended = line.maybe('ended', v.dayIn);
    const outcome = line.maybe('outcome', outcomeIn) ?? 'lost';
    const holderId = line.text('female') ? await idOf(scope, line, 'female') : null;
    const begun = await entry(scope, {
      kind: 'holdingSeen',
      holdId,
      tankId: await idOf(scope, line, 'tank'),
      colonyId: line.text('colony') ? await idOf(scope, line, 'colony') : null,
      holderId,
      plan: 'leave',
      note: line.text('note'),
      firstSeenOn: seen,
      spawnEarliest: addDays(seen, -2),
      spawnLatest: seen,
      parentage: {
        paternity: 'single',
        basis: null,
        sires: [],
        dams: holderId ? [{ fishId: holderId, weight: 1 }] : [],
      },
    });
    if (!ended) return [begun];
    return [begun, await entry(scope, { kind: 'holdEnded', holdId, onDay: ended, outcome, brood: null, note: null })];
  },

  broods: async (scope, line) => {
    const [broodId, batchId] = [newId(scope.now), newId(scope.now)];
    const onDay = line.read('day', v.dayIn);
    const spawned = line.maybe('spawned', v.dayIn) ?? onDay;
    const parent = async (field: string) =>
      line.text(field) ? [{ fishId: await idOf(scope, line, field), weight: 1 }] : [];
    const made = [
      await entry(scope, {
        kind: 'broodFound',
        broodId,
        batchId,
        code: line.read('code', String),
        strainId: await idOf(scope, line, 'strain'),
        start: 'found',
        onDay,
        spawnEarliest: spawned,
        spawnLatest: spawned,
        parentage: { paternity: 'single', basis: null, sires: await parent('male'), dams: await parent('female') },
        tankId: await idOf(scope, line, 'tank'),
        numbers: { total: null, eggs: null, wrigglers: null, freeSwimming: null, dead: null, deformed: null },
        opening: line.maybe('heads', v.headsIn),
        note: line.text('note'),
      }),
    ];
    let isOpen = line.text('heads') !== null;
    for (const { day, heads } of line.counts) {
      // Past the present month's end nothing can have been counted: the count is of today.
      const on = day > scope.today && day.slice(0, 7) === scope.today.slice(0, 7) ? scope.today : day;
      const content = isOpen || heads === 0 ? 'headCounted' : 'headsOpened';
      made.push(await entry(scope, { kind: content, batchId, onDay: on, heads, note: null }));
      isOpen = true;
    }
    return made;
  },

  counts: async (scope, line) => [
    await entry(scope, {
      kind: 'headCounted',
      batchId: await batchOf(scope, line),
      onDay: line.read('day', v.dayIn),
      heads: line.read('heads', v.headsIn),
      note: line.text('note'),
    }),
  ],

  samples: async (scope, line) => {
    const lengths = line.read('lengths', (text) =>
      text
        .trim()
        .split(/[\s;|/]+/)
        .map((one) => ({ lengthTenthsMm: v.tenthsMmIn(one, line.units), weightG: null })),
    );
    return [
      await entry(scope, {
        kind: 'lengthSampled',
        sampleId: newId(scope.now),
        of: await subjectOf(scope, line),
        onDay: line.read('day', v.dayIn),
        measure: 'total',
        method: 'ruler',
        readings: lengths,
        note: line.text('note'),
      }),
    ];
  },
};

/** A stripped or released hold has a brood: that is a line of the broods' file. */
function outcomeIn(text: string): 'swallowed' | 'lost' | 'diedHolding' {
  const word = text.trim().toLowerCase();
  if (['swallowed', 'eaten'].includes(word)) return 'swallowed';
  if (['lost', 'none', 'failed'].includes(word)) return 'lost';
  if (['died', 'died holding', 'dead'].includes(word)) return 'diedHolding';
  throw new v.Unreadable('Write swallowed, lost or died. A hold with fry comes in as a brood');
}

function checked<S extends z.ZodMiniType>(shape: S, value: unknown): z.output<S> {
  const found = shape.safeParse(value);
  if (!found.success) throw new Refusal('invalid', 'Some of that needs another look', fieldsOf(found.error));
  return found.data;
}

async function entry(scope: Scope, content: unknown): Promise<Made> {
  const id = newId(scope.now);
  await keepEntry(scope, { id, madeAt: scope.now, dependsOn: [], content: checked(EntryContent, content) });
  return { table: 'entry', id };
}
