/** So many rows at a time: a slow phone needs some milliseconds to copy them for a worker. */
const ROWS_AT_ONCE = 100;

/** Hands a long list to a worker bit by bit, with a breath between, so that a finger need not wait. */
export async function handOver<Row>(
  rows: readonly Row[],
  give: (part: readonly Row[], at: { first: boolean; last: boolean }) => Promise<unknown>,
): Promise<void> {
  for (let from = 0; from === 0 || from < rows.length; from += ROWS_AT_ONCE)
    await give(rows.slice(from, from + ROWS_AT_ONCE), { first: from === 0, last: from + ROWS_AT_ONCE >= rows.length });
}
