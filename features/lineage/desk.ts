import { type Remote, wrap } from 'comlink';
import { handOver } from '@/hooks/handOver';
import { numberOf } from '@/hooks/useWorked';
import type { DeskWork } from './deskWork';
import type { Nodes } from './entries';

let desk: Remote<DeskWork> | null = null;

/** The pedigrees on the desk, oldest first: the whole one, and those around the last few animals that were looked at. */
const lying = new Map<Nodes, Promise<void>>();
const ROOM_FOR = 4;

/** Where the pedigree is worked on, off the page's own thread; `turn` is the pedigree's number there. */
export async function deskWith(nodes: Nodes): Promise<{ desk: Remote<DeskWork>; turn: number }> {
  desk ??= wrap<DeskWork>(new Worker(new URL('./desk.worker', import.meta.url)));
  const turn = numberOf(nodes);
  const there = lying.get(nodes) ?? lay(desk, nodes, turn);
  await there;
  return { desk, turn };
}

function lay(on: Remote<DeskWork>, nodes: Nodes, turn: number): Promise<void> {
  const there = handOver(nodes, (part, { last }) => on.take(turn, part, last));
  lying.set(nodes, there);
  const [oldest] = lying.keys();
  if (oldest && lying.size > ROOM_FOR) {
    lying.delete(oldest);
    void on.drop(numberOf(oldest));
  }
  return there;
}
