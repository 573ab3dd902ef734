export type CellPlace = { row: number; column: number };

/** The cell that was pressed or has the focus, by the mark that it carries. */
export function cellAt(target: unknown): CellPlace | null {
  if (typeof Element === 'undefined' || !(target instanceof Element)) return null;
  const mark = target.closest('[data-cell]')?.getAttribute('data-cell')?.split(' ').map(Number);
  const [row, column] = mark ?? [];
  return row === undefined || column === undefined ? null : { row, column };
}

const STEPS: Record<string, [number, number]> = {
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
};

/** Where a key leads from a cell; null for other keys and at the edge. */
export function cellBeside(at: CellPlace, key: string, table: { rows: number; columns: number }): CellPlace | null {
  const end = key === 'Home' ? 0 : key === 'End' ? table.columns - 1 : null;
  if (end !== null) return { row: at.row, column: end };
  const step = STEPS[key];
  if (!step) return null;
  const to = { row: at.row + step[0], column: at.column + step[1] };
  const inside = to.row >= 0 && to.row < table.rows && to.column >= 0 && to.column < table.columns;
  return inside ? to : null;
}
