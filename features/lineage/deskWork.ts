import { transfer } from 'comlink';
import type { Stage } from '@/shared/broods/stage';
import { allEquivalentGenerations } from '@/shared/lineage/completeness';
import { kinship, packedKinship } from '@/shared/lineage/kinship';
import type { PackedKinship } from '@/shared/lineage/kinshipMatrix';
import { type ColonyFacts, coloniesOf, colonyFacts } from './colonyFacts';
import { entriesOf, type Nodes } from './entries';
import { type GroupFacts, groupFacts } from './founderFacts';
import { graphOf, type LineageDrawing } from './graphOf';
import type { Kin } from './kin';
import { type PairFacts, pairFacts } from './pairFacts';

type Held = Pick<Kin, 'entries' | 'depth'> & { nodes: Nodes; byId: ReadonlyMap<string, Nodes[number]> };

/** The pedigrees that the page has open, by their numbers there. */
const held = new Map<number, Held>();
/** Those that are being handed over. */
const coming = new Map<number, Nodes[number][]>();

function of(turn: number): Held {
  const found = held.get(turn);
  if (!found) throw new Error('This pedigree is not on the desk');
  return found;
}

const picked = ({ byId }: Held, ids: readonly string[]): Nodes[number][] => ids.flatMap((id) => byId.get(id) ?? []);

/** All that takes long of the Lineage place. Runs in a worker; every answer is plain data. */
export const deskWork = {
  take(turn: number, part: Nodes, last: boolean): void {
    const nodes = [...(coming.get(turn) ?? []), ...part];
    coming.set(turn, nodes);
    if (!last) return;
    coming.delete(turn);
    const entries = entriesOf(nodes);
    const byId = new Map(nodes.map((node) => [node.id, node]));
    held.set(turn, { nodes, byId, entries, depth: allEquivalentGenerations(entries) });
  },
  drop(turn: number): void {
    held.delete(turn);
  },
  /** Both in the order of `ids`; handed over, not copied. */
  kinship(turn: number, ids: string[]): { packed: Omit<PackedKinship, 'ids'>; depths: Float64Array } {
    const { entries, depth } = of(turn);
    const { classOf, values, self } = packedKinship(entries, ids);
    const depths = Float64Array.from(ids, (id) => depth.get(id) ?? 0);
    const packed = { classOf, values, self };
    return transfer({ packed, depths }, [classOf.buffer, values.buffer, self.buffer, depths.buffer]);
  },
  founders(
    turn: number,
    groupIds: string[],
    fishIds: string[],
    chosen: boolean,
  ): { facts: GroupFacts; colonies: ColonyFacts[] } {
    const desk = of(turn);
    const { nodes, entries, depth } = desk;
    const kin = { entries, depth, matrix: kinship(entries, groupIds) };
    return {
      facts: groupFacts(nodes, kin, picked(desk, groupIds)),
      colonies: coloniesOf(picked(desk, fishIds), chosen).map((colony) => colonyFacts(nodes, kin, colony)),
    };
  },
  pair(turn: number, a: string, b: string): PairFacts | null {
    const desk = of(turn);
    const { nodes, entries, depth, byId } = desk;
    const [one, other] = [byId.get(a), byId.get(b)];
    return one && other ? pairFacts(nodes, { entries, depth, matrix: kinship(entries, [a, b]) }, [one, other]) : null;
  },
  drawing(turn: number, shownIds: string[], stages: ReadonlyMap<string, Stage>): LineageDrawing {
    const desk = of(turn);
    return graphOf(picked(desk, shownIds), desk.nodes, (id) => stages.get(id));
  },
};

export type DeskWork = typeof deskWork;
