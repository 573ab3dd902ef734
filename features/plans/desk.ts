import { type Remote, wrap } from 'comlink';
import { useMemo, useState } from 'react';
import { handOver } from '@/hooks/handOver';
import { useWorked } from '@/hooks/useWorked';
import type { LineageNode } from '@/shared/lineage/contract';
import { type KinshipMatrix, matrixOf } from '@/shared/lineage/kinshipMatrix';
import type { Proposal } from '@/shared/lineage/proposeGroups';
import type { DeskWork, Wanted } from './deskWork';
import type { FoundersOf } from './why';

type Nodes = readonly LineageNode[];

let desk: Remote<DeskWork> | null = null;
let lying: { nodes: Nodes; there: Promise<void> } | null = null;

/** Where planning is worked out, off the page's own thread. */
async function deskWith(nodes: Nodes): Promise<Remote<DeskWork>> {
  desk ??= wrap<DeskWork>(new Worker(new URL('./desk.worker', import.meta.url)));
  const on = desk;
  if (lying?.nodes !== nodes) {
    const before = lying?.there ?? Promise.resolve();
    lying = { nodes, there: before.then(() => handOver(nodes, (part, { first }) => on.take(part, first))) };
  }
  await lying.there;
  return on;
}

/** Kinships of some fish; nothing until they are worked out. Swapping fish reads them. */
export function useMatrix(nodes: Nodes, ids: readonly string[]): KinshipMatrix | null {
  const wanted = useSame([...new Set(ids)]);
  const { data } = useWorked('plan kinship', [nodes, wanted], async () => (await deskWith(nodes)).kinship(wanted));
  return useMemo(() => (data ? matrixOf({ ...data, ids: wanted }) : null), [data, wanted]);
}

/** The group that fits; the one before until the next is worked out, so that the page does not jump. */
export function useProposal(nodes: Nodes, asked: Wanted): Proposal | null {
  const wanted = useSame(asked);
  const { data } = useWorked(
    'plan group',
    [nodes, wanted],
    async (): Promise<Proposal> => (await deskWith(nodes)).propose(wanted),
  );
  return useLast(data) ?? null;
}

/** Founders' shares of any of these fish together; of others, or until it is worked out, none. */
export function useFounders(nodes: Nodes, ids: readonly string[]): FoundersOf {
  const wanted = useSame([...new Set(ids)].sort());
  const { data } = useWorked('plan founders', [nodes, wanted], async () => (await deskWith(nodes)).founders(wanted));
  const each = useLast(data);
  return useMemo(
    () => (of) => {
      const shares = new Map<string, number>();
      for (const id of of)
        for (const [founder, share] of each?.get(id) ?? [])
          shares.set(founder, (shares.get(founder) ?? 0) + share / of.length);
      return shares;
    },
    [each],
  );
}

/** The same thing for as long as it says the same. */
function useSame<Thing>(thing: Thing): Thing {
  const text = JSON.stringify(thing);
  // biome-ignore lint/correctness/useExhaustiveDependencies: made anew at every drawing; what it says is `text`
  return useMemo(() => thing, [text]);
}

function useLast<Value>(value: Value | undefined): Value | undefined {
  const [last, setLast] = useState(value);
  if (value !== undefined && value !== last) setLast(value);
  return value ?? last;
}
