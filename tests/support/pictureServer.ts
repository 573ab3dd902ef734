import { randomBytes } from 'node:crypto';
import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { createServer } from 'node:http';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express, { type ErrorRequestHandler } from 'express';
import { openPictures, type Pictures } from '@/server/pictures';
import { uuidV7 } from '@/shared/ids';
import { Refusal, STATUS } from '@/shared/refusal';

export const pictureId = (): string => uuidV7(Date.now(), randomBytes(10));

export const MAX_BYTES = 2_000_000;

export type Answer = { status: number; body: Record<string, unknown>; headers: Headers };

export type PictureServer = {
  pictures: Pictures;
  folder: string;
  roomId: string;
  origin: string;
  port: number;
  /** Whatever was thrown that is no refusal: must stay empty. */
  faults: unknown[];
  send(file: Buffer, more?: { name?: string; type?: string; id?: string }): Promise<Answer>;
  /** Bytes as they are, on a connection of their own; resolves with all that came back when the server is done. */
  raw(bytes: Buffer | string, hangUp?: 'after-sending'): Promise<string>;
  incoming(): string[];
  stored(): string[];
  empty(): Promise<void>;
  close(): Promise<void>;
};

/** Express with nothing but pictures: what is tested is what stands between the socket and the disk. */
export async function pictureServer(maxBytes = MAX_BYTES): Promise<PictureServer> {
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-pictures-'));
  const pictures = await openPictures({ folder, maxBytes });
  const roomId = pictureId();
  const faults: unknown[] = [];
  const app = express();
  app.post('/pictures/:id', async (req, res) => {
    const answer = await pictures.receive(req, res, async ({ file, fields }) => {
      const { discard, keep, files, ...about } = await pictures.store(file, roomId, req.params.id);
      keep();
      return { ...about, fields };
    });
    res.json(answer);
  });
  app.get('/pictures/:id/:size', (req, res) => {
    const size = req.params.size === 'small' ? 'small' : 'large';
    return pictures.send(res, { roomId, id: req.params.id, size, name: String(req.query['name'] ?? 'fish') });
  });
  app.use(answerInOneShape(faults));
  const server = createServer(app);
  await new Promise<void>((ready) => server.listen(0, '127.0.0.1', ready));
  const address = server.address();
  const port = typeof address === 'object' && address ? address.port : 0;
  const origin = `http://127.0.0.1:${port}`;
  const roomFolder = join(folder, roomId);
  return {
    pictures,
    folder,
    roomId,
    origin,
    port,
    faults,
    send: async (file, { name = 'fish.jpg', type = 'image/jpeg', id = pictureId() } = {}) => {
      const form = new FormData();
      form.append('picture', new Blob([new Uint8Array(file)], { type }), name);
      const answer = await fetch(`${origin}/pictures/${id}`, { method: 'POST', body: form });
      return { status: answer.status, body: { id, ...(await answer.json()) }, headers: answer.headers };
    },
    raw: (bytes, hangUp) => rawAnswer(port, bytes, hangUp === 'after-sending'),
    incoming: () => readdirSync(join(folder, '.incoming')),
    stored: () => (existsSync(roomFolder) ? readdirSync(roomFolder) : []),
    empty: () => pictures.removeRoom(roomId),
    close: async () => {
      server.closeAllConnections();
      await new Promise((closed) => server.close(closed));
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

const answerInOneShape =
  (faults: unknown[]): ErrorRequestHandler =>
  (error, _req, res, next) => {
    if (res.headersSent) return next(error);
    if (!(error instanceof Refusal)) faults.push(error);
    const refusal = error instanceof Refusal ? error : new Refusal('broken', String(error));
    if (refusal.retryAfter !== undefined) res.set('Retry-After', String(refusal.retryAfter));
    res.status(STATUS[refusal.reason]).json({
      error: { reason: refusal.reason, message: refusal.message, fields: refusal.fields },
    });
  };

function rawAnswer(port: number, bytes: Buffer | string, hangUp: boolean): Promise<string> {
  return new Promise((done) => {
    const socket = connect(port, '127.0.0.1', () => {
      socket.write(bytes, () => hangUp && socket.destroy());
    });
    let text = '';
    socket.setEncoding('latin1');
    socket.on('data', (chunk) => {
      text += chunk;
      if (text.includes('}}') || /\r\n\r\n.*\}$/s.test(text)) socket.end();
    });
    socket.on('error', () => done(text));
    socket.on('close', () => done(text));
  });
}

/** Waits until a claim holds, for things that end a moment after the answer. */
export async function eventually(claim: () => boolean, what: string, waitMs = 5000): Promise<void> {
  const end = Date.now() + waitMs;
  while (!claim()) {
    if (Date.now() > end) throw new Error(`not within ${waitMs} ms: ${what}`);
    await new Promise((later) => setTimeout(later, 10));
  }
}
