import exifr from 'exifr';
import * as z from 'zod/mini';
import { isDay } from '../../shared/days';

/** When the camera says it was taken: its own clock and calendar, no zone. `takenAt` is `2026-05-14T09:12:00`. */
export type Capture = { takenOn: string | null; takenAt: string | null };

const UNKNOWN: Capture = { takenOn: null, takenAt: null };
/** JPEG's blocks end at 64 kB; one that is much longer, which other formats allow, is not from a camera. */
const MAX_EXIF_BYTES = 256_000;
const PREFIX = Buffer.from('Exif\0\0', 'latin1');
const PATTERN = /^(\d{4}):(\d\d):(\d\d)[ T]((?:[01]\d|2[0-3]):[0-5]\d:[0-5]\d)/;

const Tags = z.object({ DateTimeOriginal: z.optional(z.unknown()), DateTimeDigitized: z.optional(z.unknown()) });

/** Reads the block that sharp found. A broken block is no reason to refuse the picture: its date is then unknown. */
export async function captureOf(exif: Buffer | undefined): Promise<Capture> {
  if (!exif || exif.length > MAX_EXIF_BYTES) return UNKNOWN;
  const tiff = exif.subarray(exif.subarray(0, PREFIX.length).equals(PREFIX) ? PREFIX.length : 0);
  const tags = await exifr
    .parse(tiff, { tiff: true, exif: true, pick: [0x9003, 0x9004], reviveValues: false })
    .catch(() => null);
  const read = z.safeParse(Tags, renamed(tags));
  if (!read.success) return UNKNOWN;
  return spelled(read.data.DateTimeOriginal) ?? spelled(read.data.DateTimeDigitized) ?? UNKNOWN;
}

/** exifr's name for tag 0x9004 is not the standard's. */
function renamed(tags: unknown): unknown {
  if (typeof tags !== 'object' || tags === null) return tags;
  return { ...tags, DateTimeDigitized: 'CreateDate' in tags ? tags.CreateDate : undefined };
}

function spelled(text: unknown): Capture | null {
  const [, year, month, date, time] = typeof text === 'string' ? (PATTERN.exec(text) ?? []) : [];
  const takenOn = `${year}-${month}-${date}`;
  return time && isDay(takenOn) ? { takenOn, takenAt: `${takenOn}T${time}` } : null;
}
