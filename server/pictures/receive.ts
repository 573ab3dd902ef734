import { randomBytes } from 'node:crypto';
import { rm } from 'node:fs/promises';
import type { Request, Response } from 'express';
import multer from 'multer';
import { Refusal } from '../../shared/refusal';
import * as refusals from './refusals';

/** A picture as it arrived: a temporary file that is gone when the work with it ends, and the form's other fields. */
export type Upload = { file: string; fields: Record<string, string> };

/** The form field that holds the picture; there is exactly one in a request. */
const PICTURE_FIELD = 'picture';
/** Room for the other fields and the form's own lines. */
const FORM_BYTES = 128_000;
const MAX_FIELDS = 20;

type Options = { incoming: string; maxBytes: number; maxAtOnce: number; isFull: () => boolean };

/** Takes in one picture, hands it to `use`, and takes it away again whatever happens. */
export function receiver({ incoming, maxBytes, maxAtOnce, isFull }: Options) {
  const read = multer({
    storage: multer.diskStorage({
      destination: incoming,
      filename: (_req, _file, name) => name(null, randomBytes(16).toString('hex')),
    }),
    defParamCharset: 'utf8',
    // The name is used for nothing; without this one such as `..` would count as no file at all.
    preservePath: true,
    limits: {
      fileSize: maxBytes,
      files: 1,
      fields: MAX_FIELDS,
      parts: MAX_FIELDS + 1,
      fieldSize: 16_000,
      fieldNameSize: 100,
      fieldNestingDepth: 0,
      headerPairs: 20,
    },
  }).single(PICTURE_FIELD);
  let arriving = 0;

  return async function receive<T>(req: Request, res: Response, use: (upload: Upload) => Promise<T>): Promise<T> {
    if (!req.is('multipart/form-data')) throw new Refusal('unsupported', 'Send the picture as a form with a file.');
    if (Number(req.get('content-length') ?? 0) > maxBytes + FORM_BYTES) throw refusals.tooLarge(maxBytes);
    if (arriving >= maxAtOnce || isFull()) throw refusals.tooBusy();
    arriving += 1;
    try {
      await new Promise<void>((done, failed) => read(req, res, (error: unknown) => (error ? failed(error) : done())));
      if (!req.file || req.file.size === 0) throw refusals.noPicture();
      return await use({ file: req.file.path, fields: fieldsOf(req.body) });
    } catch (error) {
      throw refusalOf(error, maxBytes);
    } finally {
      arriving -= 1;
      // Gone already, with its path, when multer itself refused the form.
      const path = req.file?.path;
      if (path) await rm(path, { force: true });
    }
  };
}

function fieldsOf(body: Record<string, unknown>): Record<string, string> {
  return Object.fromEntries(
    Object.entries(body).map(([name, text]) => {
      if (typeof text !== 'string') throw refusals.oddForm();
      return [name, text];
    }),
  );
}

/** Multer's and its parser's complaints. They have no class of their own but for the limits, so the words are read. */
function refusalOf(error: unknown, maxBytes: number): unknown {
  if (error instanceof multer.MulterError) return limitRefusal(error.code, maxBytes);
  if (!(error instanceof Error) || error instanceof Refusal) return error;
  return /^(Multipart|Malformed|Unexpected end of|Request (aborted|closed|error)|aborted)/.test(error.message)
    ? refusals.notWhole()
    : refusals.diskRefusal(error);
}

function limitRefusal(code: string, maxBytes: number): Refusal {
  if (code === 'LIMIT_FILE_SIZE') return refusals.tooLarge(maxBytes);
  if (code === 'LIMIT_FILE_COUNT' || code === 'LIMIT_UNEXPECTED_FILE') return refusals.oneAtATime();
  return code === 'STREAM_DESTROYED' ? refusals.notWhole() : refusals.oddForm();
}
