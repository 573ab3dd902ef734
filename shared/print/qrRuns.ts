/** One dark bar of a square code, in modules. */
export type QrRun = { row: number; column: number; length: number };

/** The dark modules of a square code as bars along its rows, so that a painter draws far fewer of them. */
export function qrRuns(size: number, isDark: (row: number, column: number) => boolean): QrRun[] {
  const runs: QrRun[] = [];
  for (let row = 0; row < size; row += 1) {
    let length = 0;
    for (let column = 0; column <= size; column += 1) {
      if (column < size && isDark(row, column)) length += 1;
      else {
        if (length > 0) runs.push({ row, column: column - length, length });
        length = 0;
      }
    }
  }
  return runs;
}
