import { readFileSync, statSync } from 'node:fs';
import sharp from 'sharp';
import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { STATUS } from '@/shared/refusal';
import type { PictureCase } from '../support/hostileCase';
import { oddMetadata } from '../support/hostileMetadata';
import { malformed, spoiled, truncated } from '../support/hostileParts';
import { notPictures, polyglots } from '../support/hostilePictures';
import { bombs } from '../support/hostileSizes';
import { type Answer, eventually, type PictureServer, pictureServer } from '../support/pictureServer';
import { unusual } from '../support/unusualPictures';

/** What one picture may cost while it is worked on, the largest allowed included. */
const MEMORY_LIMIT = 250_000_000;

let server: PictureServer;
beforeAll(async () => {
  server = await pictureServer(8_000_000);
});
afterEach(() => server.empty());
afterAll(() => server.close());

const KINDS: [string, PictureCase[]][] = [
  ['is no picture', notPictures],
  ['carries something else', polyglots],
  ['unpacks to something enormous', bombs],
  ['is cut off', truncated],
  ['is spoiled', spoiled],
  ['contradicts its format', malformed],
  ['has odd metadata', oddMetadata],
  ['is unusual but honest', unusual],
];

describe.each(KINDS)('a file that %s', (_kind, cases) => {
  test.each(cases)('$name: $outcome', async ({ make, outcome }) => {
    const file = await make();
    const { answer, grown } = await watchingMemory(() => server.send(file));
    expect(server.faults).toEqual([]);
    expect(grown, 'memory while it was worked on').toBeLessThan(MEMORY_LIMIT);
    await eventually(() => server.incoming().length === 0, 'nothing is left of the upload');
    if (outcome === 'stored') expect(answer.status, JSON.stringify(answer.body)).toBe(200);
    if (outcome !== 'stored' && outcome !== 'harmless')
      expect(answer.body, JSON.stringify(answer.body)).toMatchObject({ error: { reason: outcome } });
    if (answer.status === 200) await expectHarmless(answer);
    else expectRefused(answer);
  });
});

test('there are more than a hundred such files', () => {
  expect(KINDS.flatMap(([, cases]) => cases).length).toBeGreaterThan(150);
});

/** Two small WebP files without a trace of what came with the picture. */
async function expectHarmless({ body }: Answer): Promise<void> {
  const id = String(body['id']);
  expect(server.stored()).toEqual([id]);
  let bytes = 0;
  for (const [size, edge] of [
    ['large', 1280],
    ['small', 320],
  ] as const) {
    const path = server.pictures.fileOf(server.roomId, id, size);
    const about = await sharp(path).metadata();
    expect(about).toMatchObject({ format: 'webp', space: 'srgb', depth: 'uchar', hasProfile: false });
    expect(about.pages ?? 1).toBe(1);
    expect([about.exif, about.xmp, about.iptc, about.icc]).toEqual([undefined, undefined, undefined, undefined]);
    expect(Math.max(about.width, about.height)).toBeLessThanOrEqual(edge);
    expect(readFileSync(path).toString('latin1')).not.toContain('KWMARK');
    bytes += statSync(path).size;
  }
  expect(body['bytes']).toBe(bytes);
}

/** A clear "no" in words, with nothing of the machine in it, and nothing stored. */
function expectRefused({ status, body }: Answer): void {
  expect([STATUS.malformed, STATUS['too-large'], STATUS.unsupported, STATUS.invalid]).toContain(status);
  expect(server.stored()).toEqual([]);
  expect(body).toMatchObject({ error: { message: expect.stringMatching(/^[A-Z].{20,}\.$/) } });
  expect(JSON.stringify(body)).not.toMatch(/vips|sharp|multer|\/tmp|\.incoming|\bat .*:\d+/i);
}

async function watchingMemory<T>(work: () => Promise<T>): Promise<{ answer: T; grown: number }> {
  const before = process.memoryUsage.rss();
  let peak = before;
  const watch = setInterval(() => {
    peak = Math.max(peak, process.memoryUsage.rss());
  }, 5);
  const answer = await work().finally(() => clearInterval(watch));
  return { answer, grown: peak - before };
}
