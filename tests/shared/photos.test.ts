import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { depthCorrected, lengthFromPhoto, type PhotoMarks, type Point } from '@/shared/photos/lengthFromPhoto';

const relative = (got: number, expected: number) => Math.abs(got - expected) / Math.abs(expected);
const at = (x: number, y: number): Point => ({ x, y });

describe('a fish beside a ruler', () => {
  // Own example, recomputed: s = mm / px, and each end has the error of a mark along the line.
  const marks: PhotoMarks = {
    scale: [at(100, 200), at(1100, 215)],
    scaleMm: 50,
    fish: [at(150, 400), at(920, 455)],
    clickSdPx: 1.5,
    scaleSdMm: 0.1,
  };

  test('is 38.59 mm, give or take 0.15', () => {
    const length = lengthFromPhoto(marks);
    expect(relative(length?.mm ?? 0, 38.59374777852356)).toBeLessThan(1e-9);
    expect(relative(length?.sdMm ?? 0, 0.15461733145850165)).toBeLessThan(1e-9);
  });

  test('is the same whether marks are pairs or objects', () => {
    expect(
      lengthFromPhoto({
        ...marks,
        scale: [
          [100, 200],
          [1100, 215],
        ],
        fish: [
          [150, 400],
          [920, 455],
        ],
      }),
    ).toEqual(lengthFromPhoto(marks));
  });
});

// Own example, recomputed.
test('a bent fish is measured along its middle', () => {
  const length = lengthFromPhoto({
    scale: [at(0, 0), at(800, 0)],
    scaleMm: 40,
    fish: [at(0, 0), at(300, 40), at(600, 30), at(760, 0)],
    clickSdPx: 1,
  });
  expect(relative(length?.mm ?? 0, 38.280487268275046)).toBeLessThan(1e-9);
});

test('a mark more on a straight fish changes neither length nor error', () => {
  const straight: PhotoMarks = {
    scale: [at(0, 0), at(500, 0)],
    scaleMm: 50,
    fish: [at(0, 0), at(300, 0)],
    clickSdPx: 1,
  };
  const more = lengthFromPhoto({ ...straight, fish: [at(0, 0), at(120, 0), at(300, 0)] });
  expect(more?.mm).toBeCloseTo(30, 9);
  expect(more?.sdMm).toBeCloseTo(lengthFromPhoto(straight)?.sdMm ?? 0, 9);
});

test('turning and shifting the picture changes nothing', () => {
  const coordinate = fc.double({ min: -2000, max: 2000, noNaN: true });
  fc.assert(
    fc.property(fc.double({ min: 0, max: 6.28, noNaN: true }), coordinate, coordinate, (angle, dx, dy) => {
      const marks = [at(0, 0), at(800, 0), at(40, 200), at(300, 240), at(600, 230)] as const;
      const turned = marks.map((p) => {
        const { x, y } = 'x' in p ? p : { x: p[0], y: p[1] };
        return at(x * Math.cos(angle) - y * Math.sin(angle) + dx, x * Math.sin(angle) + y * Math.cos(angle) + dy);
      });
      const measure = ([a, b, ...fish]: readonly Point[]) =>
        lengthFromPhoto({ scale: [a ?? at(0, 0), b ?? at(0, 0)], scaleMm: 40, fish, clickSdPx: 1.5 });
      expect(relative(measure(turned)?.mm ?? 0, measure(marks)?.mm ?? 1)).toBeLessThan(1e-9);
      expect(relative(measure(turned)?.sdMm ?? 0, measure(marks)?.sdMm ?? 1)).toBeLessThan(1e-9);
    }),
  );
});

/** Normal deviates (Box and Muller), the same at every run. */
function normals(start: number): () => number {
  let state = start;
  const uniform = () => {
    state = (state * 1664525 + 1013904223) % 2 ** 32;
    return (state + 0.5) / 2 ** 32;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

test('the stated error is the error of marks set ten thousand times', () => {
  const normal = normals(7);
  const shaken = (p: readonly [number, number]): Point => [p[0] + 2 * normal(), p[1] + 2 * normal()];
  const fish = [
    [50, 100],
    [200, 160],
    [380, 150],
  ] as const;
  const exact = lengthFromPhoto({
    scale: [
      [0, 0],
      [400, 30],
    ],
    scaleMm: 50,
    fish: [...fish],
    clickSdPx: 2,
  });
  const lengths = Array.from({ length: 10_000 }, () => {
    const marks = { scale: [shaken([0, 0]), shaken([400, 30])] satisfies [Point, Point], fish: fish.map(shaken) };
    return lengthFromPhoto({ ...marks, scaleMm: 50, clickSdPx: 2 })?.mm ?? 0;
  });
  const mean = lengths.reduce((sum, mm) => sum + mm, 0) / lengths.length;
  const sd = Math.sqrt(lengths.reduce((sum, mm) => sum + (mm - mean) ** 2, 0) / (lengths.length - 1));
  expect(relative(exact?.sdMm ?? 0, sd)).toBeLessThan(0.03);
});

// Pin-hole camera: a fish d behind the ruler at distance D is read D / (D + d) of its length.
test('a fish 2 cm behind the ruler at 40 cm reads 60 mm and is 63', () => {
  const corrected = depthCorrected({ measuredMm: 60, cameraMm: 400, gapMm: 20 });
  expect(corrected.mm).toBeCloseTo(63, 9);
  expect(corrected.percent).toBeCloseTo(-4.761904761904767, 9);
});

test('a ruler or fish marked on one spot has no length', () => {
  const spot: PhotoMarks = { scale: [at(10, 10), at(10, 10)], scaleMm: 50, fish: [at(0, 0), at(10, 0)], clickSdPx: 1 };
  expect(lengthFromPhoto(spot)).toBeNull();
  expect(lengthFromPhoto({ ...spot, scale: [at(0, 0), at(10, 0)], fish: [at(3, 3), at(3, 3)] })).toBeNull();
});

test.each([
  ['a ruler of no length', { scaleMm: 0 }, 'Length on the ruler'],
  ['a fish with one mark', { fish: [at(0, 0)] }, 'Marks on the fish'],
  ['a negative error', { clickSdPx: -1 }, 'Error of a mark'],
  ['a mark that is nowhere', { fish: [at(0, 0), at(Number.NaN, 0)] }, 'Mark'],
])('%s is refused by name', (_, change, what) => {
  const marks: PhotoMarks = { scale: [at(0, 0), at(10, 0)], scaleMm: 50, fish: [at(0, 0), at(10, 0)], clickSdPx: 1 };
  expect(() => lengthFromPhoto({ ...marks, ...change })).toThrow(BadValue);
  expect(() => lengthFromPhoto({ ...marks, ...change })).toThrow(what);
});
