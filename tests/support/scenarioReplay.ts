import type { Entry, Happening, Scenario } from '@/server/demo/scenario/shape';
import type { LedgerEntry } from '@/shared/broods/headEntry';
import { daysBetween } from '@/shared/days';

type Of<K extends Entry['kind']> = Extract<Entry, { kind: K }>;

/** The entries of some kinds, with the day and hand. */
export function entriesOf<K extends Entry['kind']>(
  scenario: Scenario,
  kind: K,
): (Of<K> & { by: string; order?: string })[] {
  const is = (entry: Entry): entry is Of<K> => entry.kind === kind;
  return scenario.happenings.flatMap((happening) =>
    happening.what === 'entry' && is(happening.entry)
      ? [{ ...happening.entry, by: happening.by, ...(happening.order ? { order: happening.order } : {}) }]
      : [],
  );
}

type Home = { on: string; colony: string | null; tank: string | null };
export type Known = {
  homes: Home[];
  sexes: { on: string; sex: string }[];
  born: string | null;
  strain: string | null;
  left: string | null;
};

/** What a reader can work out of the happenings alone, told in their order: who lived where, of what sex, how many heads. */
export function replay(scenario: Scenario) {
  const fish = new Map<string, Known>();
  const colonies = new Map<string, { on: string; tank: string }[]>();
  const colonyStrain = new Map<string, string>();
  const batches = new Map<string, { on: string; tank: string }[]>();
  const ledgers = new Map<string, LedgerEntry[]>();
  const known = (key: string): Known => {
    const found = fish.get(key);
    if (!found) throw new Error(`${key} is spoken of before it came`);
    return found;
  };
  const strainOfBrood = new Map<string, string | null>();
  const spawnOfBrood = new Map<string, string>();
  const spawnOfHold = new Map<string, { latest: string; colony: string | null }>();
  const mixed = new Set<string>();

  const line = (
    happening: Happening,
    n: number,
    batch: string,
    rest: Pick<LedgerEntry, 'kind' | 'heads' | 'cause'>,
  ) => {
    const at = `${happening.on}T${happening.time}:00.${String(n % 1000).padStart(3, '0')}Z`;
    ledgers.set(batch, [...(ledgers.get(batch) ?? []), { id: `${batch} ${n}`, on: happening.on, at, ...rest }]);
  };

  scenario.happenings.forEach((happening, n) => {
    const { on } = happening;
    if (happening.what === 'colony') {
      colonies.set(happening.key, [{ on, tank: happening.tank }]);
      colonyStrain.set(happening.key, happening.strain);
      return;
    }
    if (happening.what === 'founders') {
      for (const { key, sex } of happening.fish) {
        if (fish.has(key)) throw new Error(`${key} came twice`);
        const home = { on, colony: happening.colony, tank: happening.tank };
        fish.set(key, { homes: [home], sexes: [{ on, sex }], born: null, strain: happening.strain, left: null });
      }
      return;
    }
    const { entry } = happening;
    switch (entry.kind) {
      case 'moved':
        if (entry.thing === 'colony') colonies.get(entry.id)?.push({ on, tank: entry.toTankId });
        if (entry.thing === 'batch') batches.get(entry.id)?.push({ on, tank: entry.toTankId });
        if (entry.thing === 'fish')
          known(entry.id).homes.push({ on, colony: entry.colonyId ?? null, tank: entry.toTankId });
        break;
      case 'sexSeen':
        known(entry.fishId).sexes.push({ on, sex: entry.sex });
        break;
      case 'fishLeft':
        known(entry.fishId).left = on;
        break;
      case 'spawnSeen':
        spawnOfHold.set(entry.holdId, { latest: entry.onDay, colony: entry.colonyId });
        break;
      case 'holdingSeen':
        spawnOfHold.set(entry.holdId, { latest: entry.spawnLatest, colony: entry.colonyId });
        break;
      case 'holdEnded': {
        if (entry.outcome === 'diedHolding') {
          const begun = scenario.happenings.find(
            (one) => one.what === 'entry' && one.entry.kind === 'holdingSeen' && one.entry.holdId === entry.holdId,
          );
          if (begun?.what === 'entry' && begun.entry.kind === 'holdingSeen' && begun.entry.holderId)
            known(begun.entry.holderId).left = on;
        }
        const { brood } = entry;
        if (!brood) break;
        const hold = spawnOfHold.get(entry.holdId);
        strainOfBrood.set(brood.broodId, hold?.colony ? (colonyStrain.get(hold.colony) ?? null) : null);
        spawnOfBrood.set(brood.broodId, hold?.latest ?? '');
        batches.set(brood.batchId, [{ on, tank: brood.tankId }]);
        if (brood.opening) line(happening, n, brood.batchId, { kind: 'opening', heads: brood.opening });
        break;
      }
      case 'broodFound':
        strainOfBrood.set(entry.broodId, entry.strainId);
        spawnOfBrood.set(entry.broodId, entry.spawnLatest);
        batches.set(entry.batchId, [{ on, tank: entry.tankId }]);
        if (entry.opening) line(happening, n, entry.batchId, { kind: 'opening', heads: entry.opening });
        break;
      case 'headsOpened':
        line(happening, n, entry.batchId, { kind: 'opening', heads: entry.heads });
        break;
      case 'headCounted':
        line(happening, n, entry.batchId, { kind: 'recount', heads: entry.heads });
        break;
      case 'headsLost':
        line(happening, n, entry.batchId, { kind: 'loss', heads: entry.heads, cause: entry.cause });
        break;
      case 'headsCulled':
        line(happening, n, entry.batchId, { kind: 'cull', heads: entry.heads });
        break;
      case 'headsLeft':
        line(happening, n, entry.batchId, { kind: entry.how, heads: entry.heads });
        break;
      case 'batchSplit':
        line(happening, n, entry.batchId, { kind: 'movedOut', heads: entry.heads });
        line(happening, n, entry.newBatchId, { kind: 'movedIn', heads: entry.heads });
        batches.set(entry.newBatchId, [{ on, tank: entry.toTankId }]);
        break;
      case 'batchJoined':
        line(happening, n, entry.batchId, { kind: 'movedOut', heads: entry.heads });
        line(happening, n, entry.intoBatchId, { kind: 'movedIn', heads: entry.heads });
        mixed.add(entry.intoBatchId);
        break;
      case 'heldBack': {
        line(happening, n, entry.batchId, { kind: 'heldBack', heads: entry.fish.length });
        const brood = entry.batchId.replace('batch:', 'brood:').replace(/\/\d+$/, '');
        for (const { id, sex } of entry.fish) {
          if (fish.has(id)) throw new Error(`${id} came twice`);
          const born = mixed.has(entry.batchId) ? null : (spawnOfBrood.get(brood) ?? null);
          const home = { on, colony: entry.colonyId, tank: entry.tankId };
          fish.set(id, {
            homes: [home],
            sexes: [{ on, sex }],
            born,
            strain: strainOfBrood.get(brood) ?? null,
            left: null,
          });
        }
        break;
      }
      default:
    }
  });

  const tankOfColony = (key: string, day: string) => colonies.get(key)?.findLast(({ on }) => on <= day)?.tank ?? null;
  /** Tank of a fish on a day; null before it came and once it had left. */
  const tankOf = (key: string, day: string): string | null => {
    const { homes, left } = known(key);
    const home = homes.findLast(({ on }) => on <= day);
    if (!home || (left !== null && day >= left)) return null;
    return home.colony ? tankOfColony(home.colony, day) : home.tank;
  };
  const sexOf = (key: string, day: string): string =>
    known(key).sexes.findLast(({ on }) => on <= day)?.sex ?? 'unknown';
  /** A fish without a birthday came as an adult, or out of a mixed batch long ago. */
  const ageOf = (key: string, day: string): number => {
    const { born } = known(key);
    return born ? daysBetween(born, day) : Number.POSITIVE_INFINITY;
  };
  return {
    fish,
    colonies,
    colonyStrain,
    batches,
    ledgers,
    strainOfBrood,
    spawnOfBrood,
    tankOf,
    tankOfColony,
    sexOf,
    ageOf,
  };
}
