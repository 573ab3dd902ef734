type Point = { x: number; y: number };
type Box = Point & { id: string; width: number; height: number };
type Line = { parent: string; child: string; points: Point[] };

/** Room between the lines that arrive at one fish, as far as its width allows. */
const PORT_GAP = 12;

/**
 * Lets every line leave its parent in the middle below and arrive above its child, the lines of one child side by side in
 * the order in which they come, so that they neither cross at the end nor run into a side.
 */
export function withPorts<L extends Line>(boxes: Box[], lines: L[]): L[] {
  const boxOf = new Map(boxes.map((box) => [box.id, box]));
  const arriving = new Map<string, L[]>(boxes.map(({ id }) => [id, []]));
  for (const line of lines) arriving.get(line.child)?.push(line);
  const shiftOf = new Map<L, number>();
  for (const [child, listed] of arriving) {
    const gap = Math.min(PORT_GAP, (boxOf.get(child)?.width ?? 0) / (listed.length + 1));
    const ordered = listed.toSorted((a, b) => comesFrom(a) - comesFrom(b));
    for (const [place, line] of ordered.entries()) shiftOf.set(line, (place - (listed.length - 1) / 2) * gap);
  }
  return lines.map((line) => {
    const [parent, child] = [boxOf.get(line.parent), boxOf.get(line.child)];
    if (!parent || !child) return line;
    const start = { x: parent.x, y: parent.y + parent.height / 2 };
    const end = { x: child.x + (shiftOf.get(line) ?? 0), y: child.y - child.height / 2 };
    return { ...line, points: [start, ...line.points.slice(1, -1), end] };
  });
}

/** Where a line is before its last bend: what decides its place among those that arrive. */
const comesFrom = ({ points }: Line): number => points.at(-2)?.x ?? 0;
