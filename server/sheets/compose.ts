import { headCountOf } from '../../shared/broods/headCount';
import { addDays, daysBetween } from '../../shared/days';
import { forecast, meanOn } from '../../shared/growth/forecast';
import { equivalentGenerations } from '../../shared/lineage/completeness';
import { generationNumbers } from '../../shared/lineage/generations';
import { inbreeding } from '../../shared/lineage/inbreeding';
import { inbreedingOutcomes } from '../../shared/lineage/outcomes';
import type { Parentage } from '../../shared/lineage/pedigree';
import { Refusal } from '../../shared/refusal';
import { animalId } from '../../shared/sheets/ancestry';
import { cautionsFor } from '../../shared/sheets/cautions';
import type { SheetContent } from '../../shared/sheets/content';
import { batchesOf, oneBrood } from '../broods';
import { oneFish } from '../fish';
import { samplesOf, samplesOfBrood } from '../growth';
import { drawKey, lineageNodes, toldAnimals } from '../lineage';
import type { Scope } from '../scope';
import { oneStrain } from '../strains';
import { careRows, readingRows } from '../water';
import { factsKnown } from './known';
import { showsPeople } from './people';

export type Subject = { thing: 'fish' | 'brood'; id: string; heads: number };
type Node = Awaited<ReturnType<typeof lineageNodes>>[number];
type Entry = SheetContent['ancestry'][number];
export type Issue = SheetContent['issue'];

/** Gathers all that a sheet says, out of what was recorded. `keyId` is the key that is going to sign it. */
export async function composeSheet(scope: Scope, subject: Subject, issue: Issue, keyId: string): Promise<SheetContent> {
  const room = await scope.db
    .selectFrom('room')
    .where('id', '=', scope.roomId)
    .select(['name', 'place'])
    .executeTakeFirstOrThrow();
  const { about, tankIds, spawn } = await (subject.thing === 'fish'
    ? fishAbout(scope, subject)
    : broodAbout(scope, subject));
  const nodes = await ancestorsOf(scope, subject.id);
  const treatments = await runningIn(scope, tankIds);
  return {
    format: 1,
    issue,
    fishroom: { id: scope.roomId, name: room.name, place: room.place, address: scope.house.config.origin, keyId },
    ...about,
    ...lineageOf(nodes, subject.id, await namingOf(scope)),
    growth: await growthOf(scope, subject, spawn),
    water: await waterOf(scope, tankIds, about.birth.taken?.on ?? addDays(scope.today, -365)),
    known: await factsKnown(scope, subject),
    photos: { count: await photoCount(scope, subject), shown: null },
    treatments,
    cautions: cautionsFor({ treated: treatments.length > 0 }),
  };
}

type About = { about: Pick<SheetContent, 'subject' | 'strain' | 'birth'>; tankIds: string[]; spawn: Spawn | null };
type Spawn = { spawnEarliest: string; spawnLatest: string };

async function fishAbout(scope: Scope, { id }: Subject): Promise<About> {
  const naming = await namingOf(scope);
  const fish = await oneFish(scope, id);
  if (fish.origin === 'imported')
    throw new Refusal('conflict', 'This fish is known from a sheet of another fishroom, which issues its sheets');
  const brood = fish.brood ? await oneBrood(scope, fish.brood.id) : null;
  return {
    about: {
      subject: {
        id: naming.animal(id),
        kind: 'fish',
        code: fish.code ?? 'not told apart',
        heads: {
          male: fish.sex === 'male' ? 1 : 0,
          female: fish.sex === 'female' ? 1 : 0,
          unsexed: fish.sex === 'unknown' ? 1 : 0,
        },
        sexSure: fish.sex === 'unknown' || fish.sexCertain,
      },
      strain: await claimOf(scope, fish.strainId, [fish.displayName ?? '']),
      birth: {
        spawned: brood
          ? { from: brood.spawnEarliest, to: brood.spawnLatest }
          : fish.bornOn
            ? { from: fish.bornOn, to: fish.bornOn }
            : null,
        taken: brood ? takenOf(brood) : null,
        arrived: fish.arrivedOn,
        raised: null,
      },
    },
    tankIds: fish.tank ? [fish.tank.id] : [],
    spawn: brood,
  };
}

async function broodAbout(scope: Scope, { id, heads }: Subject): Promise<About> {
  const brood = await oneBrood(scope, id);
  if (heads > Math.max(1, Math.floor(brood.heads))) {
    throw new Refusal('invalid', `Only ${Math.floor(brood.heads)} of this brood are here`, {
      heads: `At most ${Math.floor(brood.heads)}`,
    });
  }
  const batches = await batchesOf(scope, [id]);
  const alive = batches.reduce(
    (sum, { lines, sources }) =>
      sum + headCountOf(lines).balance * (sources.find(({ broodId }) => broodId === id)?.share ?? 0),
    0,
  );
  return {
    about: {
      subject: {
        id: animalId(scope.roomId, id),
        kind: 'brood',
        code: brood.code,
        heads: { male: 0, female: 0, unsexed: heads },
        sexSure: true,
      },
      strain: await claimOf(scope, brood.strainId, await kindsOf(scope, id)),
      birth: {
        spawned: { from: brood.spawnEarliest, to: brood.spawnLatest },
        taken: takenOf(brood),
        arrived: brood.start === 'acquired' ? brood.startedOn : null,
        // What left alive was raised too: of those that opened the count, all that did not die.
        raised:
          brood.opened === null
            ? null
            : { alive: Math.max(Math.round(alive), brood.opened - brood.lost), of: brood.opened },
      },
    },
    tankIds: brood.tanks.map((tank) => tank.id),
    spawn: brood,
  };
}

function takenOf(brood: { start: string; startedOn: string; spawnEarliest: string; spawnLatest: string }) {
  const how =
    brood.start === 'stripped' || brood.start === 'released'
      ? brood.start
      : brood.start === 'acquired'
        ? null
        : 'hatched';
  if (!how) return null;
  const middle = addDays(brood.spawnEarliest, Math.floor(daysBetween(brood.spawnEarliest, brood.spawnLatest) / 2));
  return {
    how,
    on: brood.startedOn,
    holdDay: how === 'hatched' ? null : daysBetween(middle, brood.startedOn) + 1,
  } as const;
}

/** The kinds that may be in a possible hybrid: the dam's and every possible sire's. */
async function kindsOf(scope: Scope, broodId: string): Promise<string[]> {
  const nodes = await lineageNodes(scope, broodId);
  const brood = nodes.find(({ id }) => id === broodId);
  const ids = brood && !('from' in brood) ? [...idsOf(brood.sire), ...idsOf(brood.dam)] : [];
  return [...new Set(nodes.filter(({ id }) => ids.includes(id)).flatMap(({ displayName }) => displayName ?? []))];
}

async function claimOf(scope: Scope, strainId: string | null, kinds: string[]): Promise<SheetContent['strain']> {
  if (!strainId) {
    const names = kinds.filter((name) => name !== '');
    return {
      claim: 'possibleHybrid',
      kinds: [...names, 'species not known', 'species not known']
        .slice(0, Math.max(2, names.length))
        .map((scientific) => ({ scientific, locality: null })),
    };
  }
  const strain = await oneStrain(scope, strainId);
  if (strain.naming === 'hybrid') {
    return {
      claim: 'hybrid',
      kinds: [
        { scientific: strain.displayName, locality: strain.locality },
        { scientific: 'another kind', locality: null },
      ],
    };
  }
  const { locality, localityKnown, citesSource } = strain;
  const showPeople = await showsPeople(scope);
  return {
    claim: 'strain',
    code: strain.code,
    scientific: strain.displayName,
    naming: strain.naming === 'lineBred' ? 'described' : strain.naming,
    tradeName: strain.tradeName,
    synonyms: strain.synonyms
      ? strain.synonyms
          .split(/[;,]/)
          .map((name) => name.trim())
          .filter(Boolean)
          .slice(0, 12)
      : [],
    locality:
      localityKnown === 'unknown' || !locality
        ? { known: 'unknown' }
        : { known: localityKnown, name: locality, waters: null },
    lineBred: strain.naming === 'lineBred' ? 'bred for looks' : null,
    founders: {
      provenance: strain.provenance,
      from: showPeople ? strain.fromWhom : null,
      on: strain.acquiredOn?.slice(0, 7) ?? null,
      papers: strain.papers,
    },
    source: citesSource === 'A' || citesSource === 'Y' ? null : citesSource,
  };
}

const idsOf = (parent: Parentage): string[] =>
  parent.kind === 'known'
    ? [parent.id]
    : parent.kind === 'unknown'
      ? []
      : parent.candidates.flatMap(({ id }) => id ?? []);

const parentIds = (node: Node): string[] =>
  'from' in node
    ? node.from.flatMap(({ sire, dam }) => [...idsOf(sire), ...idsOf(dam)])
    : [...idsOf(node.sire), ...idsOf(node.dam)];

/** The animal and every possible ancestor. */
async function ancestorsOf(scope: Scope, id: string): Promise<Node[]> {
  const nodes = new Map((await lineageNodes(scope, id)).map((node) => [node.id, node]));
  const found = new Set([id]);
  for (const each of found) for (const parent of parentIds(nodes.get(each) ?? FOUNDER)) found.add(parent);
  return [...found].flatMap((each) => nodes.get(each) ?? []);
}

const FOUNDER = { sire: { kind: 'unknown' }, dam: { kind: 'unknown' } } as Extract<Node, { sire: unknown }>;

/** How animals and draws are named beyond the fishroom. */
type Naming = {
  animal: (id: string) => string;
  draw: (key: string) => string;
  room: (id: string) => string | null;
  told: (id: string) => Entry | undefined;
};

/** An animal that came in by a sheet keeps its first issuer's name, so that it is one animal on every sheet. */
async function namingOf(scope: Scope): Promise<Naming> {
  const told = await toldAnimals(scope);
  const showPeople = await showsPeople(scope);
  return {
    animal: (id) => told.get(id)?.name ?? animalId(scope.roomId, id),
    draw: (key) => drawKey(scope.roomId, key),
    room: (id) => (showPeople ? (told.get(id)?.room.slice(0, 120) ?? null) : null),
    told: (id) => told.get(id)?.entry,
  };
}

function lineageOf(
  nodes: Node[],
  id: string,
  naming: Naming,
): Pick<SheetContent, 'generation' | 'inbreeding' | 'ancestry'> {
  const founders = new Map(
    nodes.flatMap((node) => (node.founderGeneration === null ? [] : [[node.id, node.founderGeneration] as const])),
  );
  const generations = generationNumbers(nodes, founders);
  const told = (nodeId: string): SheetContent['generation'] => {
    const range = generations.get(nodeId) ?? null;
    if (!range) return naming.told(nodeId)?.generation ?? null;
    return range && { ...range, oneParentWild: oneParentWild(nodes, nodeId, founders) };
  };
  return {
    generation: told(id),
    inbreeding: {
      f: inbreeding(nodes).get(id) ?? 0,
      outcomes: inbreedingOutcomes(nodes, id),
      generationsKnown: equivalentGenerations(nodes, id),
    },
    ancestry: nodes.map((node) => entryOf(node, naming, told(node.id))),
  };
}

function oneParentWild(nodes: Node[], id: string, founders: Map<string, number>): boolean {
  const node = nodes.find((one) => one.id === id);
  if (!node || 'from' in node) return false;
  const wild = (parent: Parentage) => {
    const ids = idsOf(parent);
    return ids.length > 0 && ids.every((one) => founders.get(one) === 0);
  };
  return (
    wild(node.sire) !== wild(node.dam) &&
    (wild(node.sire) || wild(node.dam)) &&
    idsOf(node.sire).length > 0 &&
    idsOf(node.dam).length > 0
  );
}

function entryOf(
  node: Node,
  { animal: named, draw, room, told: toldOf }: Naming,
  generation: SheetContent['generation'],
): Entry {
  const origin =
    node.founderGeneration === 0
      ? 'wild'
      : parentIds(node).length > 0 || node.thing === 'brood' || (node.founderGeneration ?? 0) > 0
        ? 'bred'
        : (toldOf(node.id)?.origin ?? 'unknown');
  const animal = {
    id: named(node.id),
    kind: node.thing,
    code: node.code ?? 'not told apart',
    sex: node.sex === 'unknown' ? ('unsexed' as const) : node.sex,
    born: node.bornOn,
    origin: origin as Entry['origin'],
    generation,
    strain: node.strainCode,
    room: room(node.id),
  };
  const parent = (told: Parentage): Parentage => {
    if (told.kind === 'known') return { kind: 'known', id: named(told.id) };
    if (told.kind === 'unknown') return told;
    const candidates = told.candidates.map(({ id, weight }) => ({ id: id && named(id), weight }));
    return told.kind === 'mixed' ? { kind: 'mixed', candidates } : { kind: 'oneOf', key: draw(told.key), candidates };
  };
  if ('from' in node)
    return {
      ...animal,
      from: node.from.map(({ sire, dam, weight }) => ({ sire: parent(sire), dam: parent(dam), weight })),
    };
  return { ...animal, sire: parent(node.sire), dam: parent(node.dam) };
}

async function growthOf(scope: Scope, { thing, id }: Subject, spawn: Spawn | null): Promise<SheetContent['growth']> {
  const all = thing === 'brood' ? await samplesOfBrood(scope, id) : await samplesOf(scope, { fishIds: [id] });
  const samples = all.map(({ onDay, measure, readings }) => ({
    onDay,
    measure,
    lengthsMm: readings.map(({ lengthTenthsMm }) => lengthTenthsMm / 10),
  }));
  const born = spawn ?? {
    spawnEarliest: samples[0]?.onDay ?? scope.today,
    spawnLatest: samples[0]?.onDay ?? scope.today,
  };
  const grown = forecast({ samples, ...born, today: scope.today, prior: null });
  const [first, last] = [grown.points[0], grown.points.at(-1)];
  if (!first || !last) return null;
  return {
    measure: grown.measure,
    samples: grown.points.map(({ onDay, n, meanMm, sdMm }) => ({ on: onDay, n, meanMm, sdMm })),
    fitted:
      grown.kind === 'curve' ? { model: grown.fit.model, points: curvePoints(grown, first.onDay, last.onDay) } : null,
  };
}

const CURVE_POINTS = 24;

function curvePoints(curve: Extract<ReturnType<typeof forecast>, { kind: 'curve' }>, from: string, to: string) {
  const span = daysBetween(from, to);
  const days = [
    ...new Set(
      Array.from({ length: CURVE_POINTS + 1 }, (_, i) => addDays(from, Math.round((i * span) / CURVE_POINTS))),
    ),
  ];
  return days.map((on) => ({ on, meanMm: Math.max(0.1, meanOn(curve, on)) }));
}

const MEASURES = {
  celsius: 'celsius',
  ph: 'ph',
  khCaCo3MgL: 'kh',
  ghCaCo3MgL: 'gh',
  nitrateNMgL: 'nitrate',
  conductivityUs: 'conductivity',
} as const;

/** What the water was, over the readings of the tanks the fish are in now. */
async function waterOf(scope: Scope, tankIds: string[], since: string): Promise<SheetContent['water']> {
  const readings: Awaited<ReturnType<typeof readingRows>> = [];
  for (const tankId of tankIds) readings.push(...(await readingRows(scope, { tankId, since })));
  const days = readings.map(({ onDay }) => onDay).sort();
  const [from, to] = [days[0], days.at(-1)];
  if (!from || !to) return null;
  const told = (Object.keys(MEASURES) as (keyof typeof MEASURES)[]).flatMap((key) => {
    const values = readings.flatMap((reading) => reading[key] ?? []);
    if (values.length === 0) return [];
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    return [{ what: MEASURES[key], mean, low: Math.min(...values), high: Math.max(...values) }];
  });
  return told.length > 0 ? { from, to, readings: told } : null;
}

async function runningIn(scope: Scope, tankIds: string[]): Promise<SheetContent['treatments']> {
  const running: Awaited<ReturnType<typeof careRows>> = [];
  for (const tankId of tankIds) running.push(...(await careRows(scope, { tankId })));
  return running
    .filter(
      ({ kind, ended, untilDay }) => kind === 'treatment' && !ended && (untilDay === null || untilDay >= scope.today),
    )
    .map(({ what, why, onDay, untilDay }) => ({ what: what ?? 'Treatment', why, from: onDay, to: untilDay }));
}

async function photoCount({ db, roomId }: Scope, { thing, id }: Subject): Promise<number> {
  const row = await db
    .selectFrom('photo')
    .where('roomId', '=', roomId)
    .where(thing === 'fish' ? 'fishId' : 'broodId', '=', id)
    .select(({ fn }) => fn.countAll<number>().as('n'))
    .executeTakeFirst();
  return row?.n ?? 0;
}
