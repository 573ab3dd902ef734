import { pictureId } from './pictureServer';

/** Forms written by hand, since no client would send what these must hold. */
export const BOUNDARY = 'kwboundary';
export type Part = { head: string; body?: Buffer | string };

export const bytesOf = (...parts: (Buffer | string)[]): Buffer =>
  Buffer.concat(parts.map((part) => (typeof part === 'string' ? Buffer.from(part, 'utf8') : part)));

export const filePartOf = (body: Buffer | string, name = 'fish.jpg', field = 'picture'): Part => ({
  head: `Content-Disposition: form-data; name="${field}"; filename="${name}"\r\nContent-Type: image/jpeg`,
  body,
});

export const fieldPart = (name: string, value: string): Part => ({
  head: `Content-Disposition: form-data; name="${name}"`,
  body: value,
});

export const formOf = (...parts: Part[]): Buffer =>
  bytesOf(
    ...parts.flatMap(({ head, body = '' }) => [`--${BOUNDARY}\r\n${head}\r\n\r\n`, body, '\r\n']),
    `--${BOUNDARY}--\r\n`,
  );

type Sent = { type?: string; length?: number | null; headers?: string; id?: string };
export function requestOf(
  body: Buffer,
  { type, length = body.length, headers = '', id = pictureId() }: Sent = {},
): Buffer {
  const lines = [
    `POST /pictures/${id} HTTP/1.1`,
    'Host: localhost',
    'Connection: close',
    `Content-Type: ${type ?? `multipart/form-data; boundary=${BOUNDARY}`}`,
    ...(length === null ? [] : [`Content-Length: ${length}`]),
  ].join('\r\n');
  return bytesOf(`${lines}\r\n${headers}\r\n`, body);
}

export const statusOf = (answer: string): number => Number(/^HTTP\/1\.1 (\d{3})/.exec(answer)?.[1] ?? 0);
