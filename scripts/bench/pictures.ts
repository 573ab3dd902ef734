import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import sharp from 'sharp';
import { openPictures, type Pictures } from '../../server/pictures';
import { uuidV7 } from '../../shared/ids';

import type { Figure } from './figure';

const ROUNDS = 9;
const MB = 1_000_000;

/** Storing a 12 MP photo, flushed to disk, beside sharp alone in memory; and what eight at once add to the process. */
export async function bench(): Promise<Figure[]> {
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-bench-'));
  try {
    const pictures = await openPictures({ folder, maxBytes: 25 * MB });
    const photo = pictures.tempPath();
    writeFileSync(photo, await cameraPhoto());
    await store(pictures, photo);
    return [await timeFigure(pictures, photo), await memoryFigure(pictures, photo)];
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const store = (pictures: Pictures, photo: string) => pictures.store(photo, newId(), newId());

let made = 0;
const newId = (): string => {
  made += 1;
  return uuidV7(made, new Uint8Array(10));
};

/** In turns, so that a busy moment of the machine falls on both. */
async function timeFigure(pictures: Pictures, photo: string): Promise<Figure> {
  const ours: number[] = [];
  const anchor: number[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    ours.push(await spanOf(() => store(pictures, photo)));
    anchor.push(await spanOf(() => bareSharp(photo)));
  }
  return {
    figure: 'Both sizes of a 12 MP photo',
    ours: median(ours),
    anchor: median(anchor),
    anchorName: 'bare sharp, one after the other',
    unit: 'ms',
    goal: '<= 1.3x bare sharp',
  };
}

/** The textbook way: one pipeline, cloned for each size, nothing written to disk. */
async function bareSharp(photo: string): Promise<void> {
  const picture = sharp(photo).autoOrient();
  for (const edge of [1280, 320])
    await picture.clone().resize(edge, edge, { fit: 'inside' }).webp({ effort: 2 }).toBuffer();
}

async function memoryFigure(pictures: Pictures, photo: string): Promise<Figure> {
  const eight = Array.from({ length: 8 }, () => photo);
  return {
    figure: 'Memory that eight 12 MP photos at once add',
    ours: await growthOf(() => Promise.all(eight.map((path) => store(pictures, path)))),
    anchor: await growthOf(() => Promise.all(eight.map(bareSharp))),
    anchorName: 'bare sharp, all eight at once',
    unit: 'MB',
    goal: '<= 200 MB',
  };
}

async function growthOf(work: () => Promise<unknown>): Promise<number> {
  const before = process.memoryUsage.rss();
  let peak = before;
  const watch = setInterval(() => {
    peak = Math.max(peak, process.memoryUsage.rss());
  }, 2);
  await work().finally(() => clearInterval(watch));
  return (peak - before) / MB;
}

async function spanOf(work: () => Promise<unknown>): Promise<number> {
  const from = performance.now();
  await work();
  return performance.now() - from;
}

const median = (spans: number[]): number => spans.sort((one, two) => one - two)[Math.floor(spans.length / 2)] ?? 0;

/** 4000 x 3000 with the detail of a photo: soft waves under noise, about 3 MB. */
function cameraPhoto(): Promise<Buffer> {
  const [width, height] = [4000, 3000];
  const pixels = Buffer.alloc(width * height * 3);
  let state = 1;
  for (let i = 0; i < pixels.length; i += 1) {
    state = (state * 16_807) % 2_147_483_647;
    const at = Math.floor(i / 3);
    pixels[i] = 116 + 60 * Math.sin((at % width) / 90 + at / width / 70 + (i % 3)) + (state % 24);
  }
  return sharp(pixels, { raw: { width, height, channels: 3 } })
    .jpeg({ quality: 88 })
    .toBuffer();
}
