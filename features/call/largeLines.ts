import { listBroods } from '@/shared/broods/contract';
import { listFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import { readPedigree } from '@/shared/lineage/contract';

/**
 * What a fishroom of ten years answers with thousands of rows: reading and checking it takes a slow phone hundreds of
 * milliseconds, in which a finger must not wait. Such answers are read by a worker.
 */
export const LARGE = [listFish, listBroods, listHolds, readPedigree];

const read = new WeakSet<object>();

/** Such answers are kept by their reader, and are too large to be compared row by row on the page's own thread. */
export const isReadLarge = (data: unknown): boolean => typeof data === 'object' && data !== null && read.has(data);

export function markRead(data: unknown): void {
  if (typeof data === 'object' && data !== null) read.add(data);
}
