import { nameOf } from './integrity';
import type { PictureKey, Shelf } from './shelf';

export type Swept = {
  /** Pictures without a row that were taken away. */
  removed: number;
  /** Pictures without a row that were left, because there were too many for a crash to explain. */
  heldBack: number;
};

/**
 * A crash leaves at most the pictures that were on their way. More than this many without a row means that the database is
 * not the one these pictures belong to (an old backup, the wrong folder), and then nothing may be taken away.
 */
const EXPLAINED_BY_A_CRASH = 100;

/** Takes away pictures that no row knows. To be called at the start, before anything is stored. */
export async function sweepShelf(shelf: Shelf, known: Iterable<PictureKey>): Promise<Swept> {
  const names = new Set(Array.from(known, nameOf));
  const orphans = (await shelf.keys()).filter((key) => !names.has(nameOf(key)));
  if (orphans.length > EXPLAINED_BY_A_CRASH) return { removed: 0, heldBack: orphans.length };
  for (const key of orphans) await shelf.remove(key);
  return { removed: orphans.length, heldBack: 0 };
}
