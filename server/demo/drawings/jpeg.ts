import sharp, { type Sharp } from 'sharp';
import { chanceOf } from './chance';
import type { Drawing } from './description';
import { svgOf } from './draw';

/** How a camera was held: what the picture's EXIF block says must be done to see it upright. */
export type Orientation = 1 | 3 | 6 | 8;

/** The turn (degrees clockwise) that the stored pixels need so that the orientation sets them right again. */
const TURN: Record<Orientation, number> = { 1: 0, 3: 180, 6: 270, 8: 90 };

type Capture = {
  /** Local wall-clock time at the camera, '2026-03-14T09:26:00'. */
  takenAt: string;
  orientation?: Orientation;
};

const GRAIN = 128;
/** Out of focus: painted this much smaller, then drawn up. */
const FOCUS = 5;

/** Sensor noise, the same for the same picture. */
function grain(words: string): Buffer {
  const chance = chanceOf(`${words} grain`);
  return Buffer.from(Array.from({ length: GRAIN * GRAIN }, () => 128 + Math.round((chance() + chance() - 1) * 15)));
}

type Pixels = Awaited<ReturnType<typeof pixelsOf>>;

const pixelsOf = (picture: Sharp) => picture.toColourspace('srgb').raw().toBuffer({ resolveWithObject: true });
const from = ({ data, info: { width, height, channels } }: Pixels): Sharp =>
  sharp(data, { raw: { width, height, channels } });

async function outOfFocus(drawing: Drawing): Promise<Sharp> {
  const svg = svgOf(drawing, ['backdrop'], 1 / FOCUS);
  const small = await pixelsOf(sharp(Buffer.from(svg)).flatten({ background: '#101418' }).blur(1.4));
  const { w, h } = drawing.size;
  return from(await pixelsOf(from(small).resize(w, h, { fit: 'fill', kernel: 'cubic' })));
}

/** EXIF writes a time as '2026:03:14 09:26:00'. */
const exifTime = (takenAt: string): string => `${takenAt.slice(0, 10).replaceAll('-', ':')} ${takenAt.slice(11, 19)}`;

/** The drawing as a photograph: soft background, grain, capture date and orientation. Same input, same bytes. */
export async function jpegOf(drawing: Drawing, { takenAt, orientation = 1 }: Capture): Promise<Buffer> {
  const inFocus = Buffer.from(svgOf(drawing, ['subject', 'front']));
  const noise = { width: GRAIN, height: GRAIN, channels: 1 } as const;
  const backdrop = await outOfFocus(drawing);
  const picture = backdrop.composite([
    { input: inFocus },
    { input: grain(takenAt), raw: noise, tile: true, blend: 'soft-light' },
  ]);
  const time = exifTime(takenAt);
  return from(await pixelsOf(picture))
    .rotate(TURN[orientation])
    .withMetadata({ orientation })
    .withExifMerge({ IFD0: { DateTime: time }, IFD2: { DateTimeOriginal: time, DateTimeDigitized: time } })
    .jpeg({ quality: 84 })
    .toBuffer();
}
