import { frontierOf } from './frontier';
import type { Segregation } from './segregation';
import { solveByColumns } from './solveByColumns';
import type { SortedPedigree } from './sortedPedigree';
import { sweep } from './sweep';

/** A table of this many places takes 46 MB; a wider pedigree is solved by columns, slower but in linear memory. */
const WIDEST_TABLE = 3_400;

/** Kinships within every family, and with them F, in memory that grows with the length of the pedigree, not its square. */
export function solveFamilies(sorted: SortedPedigree): Segregation {
  const places = frontierOf(sorted);
  if (places.size > WIDEST_TABLE) return solveByColumns(sorted);
  const everyFamily = Array.from({ length: sorted.families }, (_, family) => family);
  const { self, within } = sweep(sorted, places, everyFamily);
  return { sorted, self, within };
}
