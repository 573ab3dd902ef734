import { BadValue, finite } from '../badValue';

/** A point of the picture in pixels, after its orientation has been set right; as an object or a pair. */
export type Point = { x: number; y: number } | readonly [x: number, y: number];

/** Marks set on a photo: two ends on the ruler, what lies between them in mm, and the fish from snout to tail. */
export type PhotoMarks = {
  scale: [Point, Point];
  scaleMm: number;
  /** Two ends, or more points along the middle of a bent fish. */
  fish: Point[];
  /** Standard deviation of one mark in pixels, along each axis. */
  clickSdPx: number;
  /** Standard deviation of the ruler's own length in mm; none if not given. */
  scaleSdMm?: number;
};

type Xy = { x: number; y: number };

/**
 * Length of a fish in mm with its standard deviation, from marks on a photo: mm per pixel on the ruler times the length of
 * the line along the fish. The error is that of the marks at both, by propagation (relative variances of fish and ruler
 * add), and of the ruler: sqrt(2 s²/fish² + 2 s²/ruler² + (s_mm/mm)²) for a straight fish. It knows nothing of tilt, depth
 * or the lens: ruler and fish must lie in one plane, square to the camera (`depthCorrected`). Null when the ruler's or the
 * fish's marks lie on one spot. Throws `BadValue` for fewer than two marks, or values that are not numbers.
 */
export function lengthFromPhoto(marks: PhotoMarks): { mm: number; sdMm: number } | null {
  const scaleMm = finite('Length on the ruler', marks.scaleMm, { above: 0 });
  const clickSd = finite('Error of a mark', marks.clickSdPx, { min: 0 });
  const scaleSd = finite('Error of the ruler', marks.scaleSdMm ?? 0, { min: 0 });
  const ruler = marks.scale.map(xyOf);
  const fish = marks.fish.map(xyOf);
  if (fish.length < 2) throw new BadValue('Marks on the fish', fish.length, 'two or more are needed');
  const [rulerPx, fishPx] = [lineLength(ruler), lineLength(fish)];
  if (rulerPx === 0 || fishPx === 0) return null;
  const mm = (scaleMm / rulerPx) * fishPx;
  const relativeVariance =
    (clickSd ** 2 * spreadOf(fish)) / fishPx ** 2 +
    (clickSd ** 2 * spreadOf(ruler)) / rulerPx ** 2 +
    (scaleSd / scaleMm) ** 2;
  return { mm, sdMm: mm * Math.sqrt(relativeVariance) };
}

function xyOf(point: Point): Xy {
  const [x, y] = 'x' in point ? [point.x, point.y] : point;
  return { x: finite('Mark', x), y: finite('Mark', y) };
}

const lineLength = (line: Xy[]) => stepsOf(line).reduce((sum, { length }) => sum + length, 0);

/** The pieces of a line: lengths and directions. A piece of no length has no direction. */
function stepsOf(line: Xy[]): { length: number; x: number; y: number }[] {
  return line.slice(1).map((to, i) => {
    const from = line[i] ?? to;
    const length = Math.hypot(to.x - from.x, to.y - from.y);
    const per = length === 0 ? 0 : 1 / length;
    return { length, x: (to.x - from.x) * per, y: (to.y - from.y) * per };
  });
}

/**
 * Variance of a line's length for marks of unit variance: an end counts 1; a mark between counts by how far the line turns
 * there, since a mark on a straight run changes nothing.
 */
function spreadOf(line: Xy[]): number {
  const steps = stepsOf(line).filter(({ length }) => length > 0);
  const turns = steps.slice(1).map((step, i) => {
    const before = steps[i] ?? step;
    return (step.x - before.x) ** 2 + (step.y - before.y) ** 2;
  });
  return 2 + turns.reduce((sum, turn) => sum + turn, 0);
}

/**
 * True length of a fish that lay `gapMm` behind the ruler's plane with the camera `cameraMm` in front of it: a pin-hole camera
 * shows it too small by D / (D + d). `percent` is that error of the reading. Throws `BadValue` for values that cannot be.
 */
export function depthCorrected(reading: { measuredMm: number; cameraMm: number; gapMm: number }): {
  mm: number;
  percent: number;
} {
  const measured = finite('Measured length', reading.measuredMm, { above: 0 });
  const camera = finite('Distance of the camera', reading.cameraMm, { above: 0 });
  const gap = finite('Gap behind the ruler', reading.gapMm, { above: -camera });
  return { mm: (measured * (camera + gap)) / camera, percent: 100 * (camera / (camera + gap) - 1) };
}

/** What a photo cannot tell, said beside every length taken from one. */
export const PHOTO_LENGTH_LIMITS =
  'The error is that of the marks. A fish 5 cm behind the ruler at 50 cm reads 9 % short, one tilted by 15° 3 % short.';
