import type { Response } from 'express';
import { notFound } from '../../shared/refusal';
import type { PictureSize } from './develop';
import { codeOf } from './refusals';
import type { PictureKey, Shelf } from './shelf';

const LONGEST_NAME = 100;

/** Headers of a served picture. `name` is what the browser calls it when it is saved, without an ending. */
function servingHeaders(name: string): Record<string, string> {
  return {
    'Content-Type': 'image/webp',
    'X-Content-Type-Options': 'nosniff',
    'Content-Security-Policy': "default-src 'none'; sandbox",
    'Cross-Origin-Resource-Policy': 'same-origin',
    // A stored picture never changes; only the browser that was let in may keep it, and signing out clears it.
    'Cache-Control': 'private, max-age=3600',
    'Content-Disposition': `inline; filename="picture.webp"; filename*=UTF-8''${encodedName(name)}.webp`,
  };
}

/** RFC 8187: percent-encoded UTF-8. Control characters, path separators and marks that turn the reading direction are dropped. */
function encodedName(name: string): string {
  const plain = name.replace(/[\p{Cc}\p{Cf}\p{Cs}/\\]/gu, '').trim();
  const letters = Array.from(plain).slice(0, LONGEST_NAME).join('') || 'picture';
  return encodeURIComponent(letters).replace(/['()*]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`);
}

/** Answers with the picture, or 304; the caller has judged who asks. */
export async function sendPicture(
  shelf: Shelf,
  res: Response,
  { name, size, ...key }: PictureKey & { size: PictureSize; name: string },
): Promise<void> {
  const path = shelf.fileOf(key, size).slice(shelf.folder.length + 1);
  res.set({ ...servingHeaders(name), ETag: `"${key.id}-${size}"` });
  await new Promise<void>((sent, failed) => {
    // The root keeps `send` from judging the folders above it, which may begin with a dot.
    res.sendFile(path, { root: shelf.folder, cacheControl: false, lastModified: false }, (error) =>
      error && !res.headersSent ? failed(error) : sent(),
    );
  }).catch((error: unknown) => {
    for (const header of ['ETag', 'Content-Disposition']) res.removeHeader(header);
    throw codeOf(error) === 'ENOENT' ? notFound('That picture') : error;
  });
}
