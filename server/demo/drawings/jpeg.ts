import sharp from 'sharp';
import { chanceOf } from './chance';
import type { Drawing } from './description';
import { svgOf } from './draw';

/** How a camera was held: what the picture's EXIF block says must be done to see it upright. */
export type Orientation = 1 | 3 | 6 | 8;

/** The turn (degrees clockwise) that the stored pixels need so that the orientation sets them right again. */
const TURN: Record<Orientation, number> = { 1: 0, 3: 180, 6: 270, 8: 90 };

export type Capture = {
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

async function outOfFocus(drawing: Drawing): Promise<Buffer> {
  const { w, h } = drawing.size;
  const svg = svgOf(drawing, 'backdrop').replace(
    /width="[\d.]+" height="[\d.]+"/,
    `width="${Math.round(w / FOCUS)}" height="${Math.round(h / FOCUS)}"`,
  );
  const small = await sharp(Buffer.from(svg))
    .flatten({ background: '#101418' })
    .png({ compressionLevel: 1 })
    .toBuffer();
  return sharp(small)
    .resize(w, h, { fit: 'fill', kernel: 'cubic' })
    .removeAlpha()
    .png({ compressionLevel: 1 })
    .toBuffer();
}

/** EXIF writes a time as '2026:03:14 09:26:00'. */
const exifTime = (takenAt: string): string => `${takenAt.slice(0, 10).replaceAll('-', ':')} ${takenAt.slice(11, 19)}`;

/** The drawing as a photograph: soft background, grain, capture date and orientation. Same input, same bytes. */
export async function jpegOf(drawing: Drawing, { takenAt, orientation = 1 }: Capture): Promise<Buffer> {
  const subject = Buffer.from(svgOf(drawing, 'subject'));
  const front = Buffer.from(svgOf(drawing, 'front'));
  const noise = { raw: { width: GRAIN, height: GRAIN, channels: 1 as const } };
  const picture = await sharp(await outOfFocus(drawing))
    .composite([
      { input: subject },
      { input: front },
      { input: grain(takenAt), ...noise, tile: true, blend: 'soft-light' },
    ])
    .png({ compressionLevel: 1 })
    .toBuffer();
  const time = exifTime(takenAt);
  return sharp(picture)
    .rotate(TURN[orientation])
    .withMetadata({ orientation })
    .withExifMerge({ IFD0: { DateTime: time }, IFD2: { DateTimeOriginal: time, DateTimeDigitized: time } })
    .jpeg({ quality: 84, mozjpeg: false })
    .toBuffer();
}
