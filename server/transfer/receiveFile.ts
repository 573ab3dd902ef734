import { randomBytes } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { join } from 'node:path';
import type { Request, Response } from 'express';
import multer from 'multer';
import { Refusal } from '../../shared/refusal';
import type { House } from '../house';

/** Takes in one file under the field `file`; it is gone when `use` ends. */
export async function receiveFile<T>(
  house: House,
  { req, res }: { req: Request; res: Response },
  maxBytes: number,
  use: (path: string) => Promise<T>,
): Promise<T> {
  if (!req.is('multipart/form-data')) throw new Refusal('unsupported', 'Send the file as a form.');
  if (Number(req.get('content-length') ?? 0) > maxBytes + 10_000) throw tooLarge(maxBytes);
  const path = house.pictures.tempPath();
  const read = multer({
    storage: multer.diskStorage({
      destination: join(path, '..'),
      filename: (_req, _file, name) => name(null, randomBytes(16).toString('hex')),
    }),
    limits: { fileSize: maxBytes, files: 1, fields: 0, parts: 1, headerPairs: 20 },
  }).single('file');
  try {
    await new Promise<void>((done, failed) => read(req, res, (error: unknown) => (error ? failed(error) : done())));
    if (!req.file || req.file.size === 0) throw new Refusal('invalid', 'Choose a file', { file: 'Choose a file' });
    return await use(req.file.path);
  } catch (error) {
    if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') throw tooLarge(maxBytes);
    if (error instanceof multer.MulterError) throw new Refusal('invalid', 'Send one file', { file: 'Send one file' });
    if (error instanceof Error && /^(Multipart|Malformed|Unexpected end of|Request |aborted)/.test(error.message))
      throw new Refusal('malformed', 'The file did not arrive whole. Send it again.');
    throw error;
  } finally {
    if (req.file?.path) await rm(req.file.path, { force: true });
  }
}

const tooLarge = (maxBytes: number): Refusal =>
  new Refusal('too-large', `A file may have ${Math.floor(maxBytes / 1_000_000)} MB at most`);
