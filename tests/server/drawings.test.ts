import { createHash } from 'node:crypto';
import exifr from 'exifr';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import {
  type Description,
  DRAWN,
  type DrawnSpecies,
  draw,
  type FishDescription,
  jpegOf,
  type Orientation,
  svgOf,
  type TrayDescription,
} from '@/server/demo/drawings';

const size = { w: 960, h: 720 };
const fish = (change: Partial<FishDescription> = {}): FishDescription => ({
  species: 'tropheus-moorii',
  setting: 'box',
  life: 'male',
  individual: 'one',
  pose: 'left',
  lengthMm: 118,
  shot: 'a',
  size,
  ...change,
});
const tray = (change: Partial<TrayDescription> = {}): TrayDescription => ({
  species: 'cyprichromis-leptosoma',
  setting: 'tray',
  life: 'fry',
  count: 8,
  lengthMm: 14,
  shot: 'a',
  size,
  ...change,
});
const species = Object.keys(DRAWN).filter((id): id is DrawnSpecies => id in DRAWN);
const hash = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex');

/** Ends of the fish along the picture: a column of pixels that it covers in part counts as that part. */
async function extentOfFish(description: Description): Promise<{ left: number; right: number }> {
  const { data, info } = await sharp(Buffer.from(svgOf(draw(description), ['subject'])))
    .ensureAlpha()
    .raw()
    .toBuffer({ resolveWithObject: true });
  const cover = Array.from({ length: info.width }, (_, x) =>
    Math.max(...Array.from({ length: info.height }, (__, y) => data[(y * info.width + x) * 4 + 3] ?? 0)),
  );
  const part = (x: number, inner: number): number => Math.min(1, (cover[x] ?? 0) / (cover[inner] ?? 255));
  const first = cover.findIndex((alpha) => alpha > 0);
  const last = cover.findLastIndex((alpha) => alpha > 0);
  return { left: first + 1 - part(first, first + 2), right: last + part(last, last - 2) };
}

describe('a drawn picture', () => {
  test('is the same byte for byte when it is drawn again', async () => {
    const once = await jpegOf(draw(fish()), { takenAt: '2026-03-14T09:26:00' });
    const again = await jpegOf(draw(fish()), { takenAt: '2026-03-14T09:26:00' });
    expect(hash(once)).toBe(hash(again));
  });

  test('differs between species, sexes, fish and shots', () => {
    const pictures = [
      ...species.map((id) => fish({ species: id })),
      fish({ species: 'maylandia-estherae', life: 'female' }),
      fish({ individual: 'two' }),
      fish({ shot: 'b' }),
      fish({ holding: true, life: 'female' }),
      fish({ setting: 'tank', companions: 2 }),
      fish({ setting: 'tank', pose: 'three-quarter' }),
      tray(),
      tray({ life: 'eggs', lengthMm: 4 }),
      tray({ life: 'yolk-fry' }),
    ].map((description) => svgOf(draw(description)));
    expect(new Set(pictures).size).toBe(pictures.length);
  });

  test.each(species)('of %s holds no broken numbers at any length, life or pose', (id) => {
    const lives = ['male', 'female', 'juvenile', 'fry', 'yolk-fry'] as const;
    const shots = [
      ...lives.map((life) => fish({ species: id, life, lengthMm: life.endsWith('fry') ? 9 : 60 })),
      fish({ species: id, pose: 'three-quarter', setting: 'tank', companions: 1, lengthMm: 5 }),
      fish({ species: id, pose: 'right', setting: 'tank', life: 'female', holding: true, lengthMm: 400 }),
    ];
    for (const shot of shots) expect(svgOf(draw(shot))).not.toMatch(/NaN|Infinity|undefined/);
  });
});

describe('a fish over the ruler', () => {
  const cases = species.flatMap((id) => [
    [id, 'left', DRAWN[id].adultMm] as const,
    [id, 'right', 41.5] as const,
    [id, 'left', 13] as const,
  ]);

  test.each(cases)('%s facing %s measures its %s mm within a pixel', async (id, pose, lengthMm) => {
    const life = lengthMm < 20 ? 'fry' : lengthMm < 50 ? 'juvenile' : 'male';
    const description = fish({ species: id, pose, lengthMm, life });
    const { left, right } = await extentOfFish(description);
    expect(Math.abs(right - left - lengthMm * draw(description).pxPerMm)).toBeLessThanOrEqual(1);
  });

  test('stands at one scale in two pictures when the width is given', () => {
    const young = draw(fish({ lengthMm: 33, spanMm: 64 }));
    const older = draw(fish({ lengthMm: 46, spanMm: 64 }));
    expect(young.pxPerMm).toBe(15);
    expect(older.pxPerMm).toBe(15);
  });

  test('shows a line for every millimetre, where the scale says', async () => {
    const drawing = draw(fish({ lengthMm: 46, spanMm: 64 }));
    const zeroX = drawing.ruler?.zeroX ?? Number.NaN;
    const y = Math.round((drawing.ruler?.topY ?? Number.NaN) + 4);
    const { data, info } = await sharp(Buffer.from(svgOf(drawing, ['front'])))
      .flatten({ background: '#ffffff' })
      .greyscale()
      .raw()
      .toBuffer({ resolveWithObject: true });
    const row = [...data.subarray(y * info.width * info.channels, (y + 1) * info.width * info.channels)].filter(
      (_, i) => i % info.channels === 0,
    );
    const lines = row.flatMap((value, x) =>
      value < 150 && (row[x - 1] ?? 255) >= value && (row[x + 1] ?? 255) > value ? [x + 0.5] : [],
    );
    const expected = Array.from({ length: lines.length }, (_, mm) => zeroX + mm * 15);
    expect(lines.length).toBe(61);
    for (const [i, x] of lines.entries()) expect(Math.abs(x - (expected[i] ?? 0))).toBeLessThanOrEqual(1);
  });
});

describe('a tray of fry', () => {
  test('keeps every fry off the ruler and inside the picture', async () => {
    const drawing = draw(tray({ count: 20 }));
    const { info } = await sharp(Buffer.from(svgOf(drawing, ['subject'])))
      .ensureAlpha()
      .trim()
      .toBuffer({ resolveWithObject: true });
    const bottom = -(info.trimOffsetTop ?? 0) + info.height;
    expect(bottom).toBeLessThanOrEqual((drawing.ruler?.topY ?? 0) + 2);
    expect(info.width).toBeLessThanOrEqual(size.w);
  });
});

describe('the photograph made of a drawing', () => {
  test('carries the day and time it was taken', async () => {
    const bytes = await jpegOf(draw(fish()), { takenAt: '2025-11-09T18:04:31' });
    const read = await exifr.parse(bytes, { reviveValues: false });
    expect(read.DateTimeOriginal).toBe('2025:11:09 18:04:31');
    expect((await sharp(bytes).metadata()).format).toBe('jpeg');
  });

  test('has the colours of the drawing', async () => {
    const drawing = draw(fish({ setting: 'tank', companions: 2 }));
    const means = async (bytes: Buffer) => (await sharp(bytes).removeAlpha().stats()).channels.map(({ mean }) => mean);
    const photograph = await means(await jpegOf(drawing, { takenAt: '2025-11-09T18:04:31' }));
    const plain = await means(Buffer.from(svgOf(drawing)));
    for (const [i, mean] of photograph.entries()) expect(Math.abs(mean - (plain[i] ?? 0))).toBeLessThan(6);
  });

  test.each([1, 3, 6, 8] as const)(
    'held as orientation %s comes upright once turned',
    async (orientation: Orientation) => {
      const takenAt = '2025-11-09T18:04:31';
      const turned = await jpegOf(draw(fish()), { takenAt, orientation });
      const meta = await sharp(turned).metadata();
      expect(meta.orientation).toBe(orientation);
      expect(meta.width).toBe(orientation > 4 ? size.h : size.w);
      const small = (bytes: Buffer) => sharp(bytes).rotate().resize(32, 24).greyscale().raw().toBuffer();
      const [upright, set] = await Promise.all([jpegOf(draw(fish()), { takenAt }).then(small), small(turned)]);
      const worst = Math.max(...upright.map((value, i) => Math.abs(value - (set[i] ?? 0))));
      expect(worst).toBeLessThan(12);
    },
  );
});
