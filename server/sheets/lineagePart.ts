import { equivalentGenerations } from '../../shared/lineage/completeness';
import { generationNumbers } from '../../shared/lineage/generations';
import { inbreeding } from '../../shared/lineage/inbreeding';
import { inbreedingOutcomes } from '../../shared/lineage/outcomes';
import type { Parentage } from '../../shared/lineage/pedigree';
import { animalId } from '../../shared/sheets/ancestry';
import type { SheetContent } from '../../shared/sheets/content';
import { drawKey, lineageNodes, toldAnimals } from '../lineage';
import type { RoomAsked } from '../scope';
import { showsPeople } from './people';

type Node = Awaited<ReturnType<typeof lineageNodes>>[number];
type Entry = SheetContent['ancestry'][number];

export const idsOf = (parent: Parentage): string[] =>
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
export async function ancestorsOf(scope: RoomAsked, id: string): Promise<Node[]> {
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
export async function namingOf(scope: RoomAsked): Promise<Naming> {
  const told = await toldAnimals(scope);
  const showPeople = await showsPeople(scope);
  return {
    animal: (id) => told.get(id)?.name ?? animalId(scope.roomId, id),
    draw: (key) => drawKey(scope.roomId, key),
    room: (id) => (showPeople ? (told.get(id)?.room.slice(0, 120) ?? null) : null),
    told: (id) => told.get(id)?.entry,
  };
}

/** Generation, F and every ancestor, named beyond the fishroom. */
export function lineageOf(
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
