import { type LookupAddress, lookup as lookUp } from 'node:dns';
import http from 'node:http';
import https from 'node:https';
import { isIP, type LookupFunction } from 'node:net';
import { isInner } from './innerAddress';

/** What may be reached, and how a name is looked up; tests put their own in. */
export type Outside = {
  /** Plain http and inner addresses too: for two installations on one developer's machine. */
  mayBeInner: boolean;
  lookUp?: (host: string, done: (error: Error | null, found: LookupAddress[]) => void) => void;
};

/** Why nothing came back. `inner`: the address leads into our own network. */
export class NotFetched extends Error {
  readonly because: 'address' | 'inner' | 'status' | 'size' | 'time' | 'connection';
  constructor(because: NotFetched['because']) {
    super(`Not fetched: ${because}`);
    this.because = because;
  }
}

const MOST_BYTES = 1_000_000;
const MOST_MS = 8000;

/**
 * Fetches a small text from an address that somebody else wrote. The name is looked up once and the connection goes to the very
 * address that was judged, so a name that changes its mind in between gains nothing; redirects are not followed.
 */
export function fetchOutside(address: string, outside: Outside, limits = { bytes: MOST_BYTES, ms: MOST_MS }) {
  return new Promise<string>((resolve, reject) => {
    const url = URL.canParse(address) ? new URL(address) : null;
    const fault = url ? faultOf(url, outside) : 'address';
    if (!url || fault) return reject(new NotFetched(fault ?? 'address'));
    const { request } = url.protocol === 'https:' ? https : http;
    const asked = request(url, {
      agent: false,
      lookup: judgedLookup(outside),
      headers: { accept: 'application/json', 'accept-encoding': 'identity', 'user-agent': 'kinwater' },
    });
    const stop = (because: NotFetched['because']) => {
      clearTimeout(timer);
      asked.destroy();
      reject(new NotFetched(because));
    };
    const timer = setTimeout(() => stop('time'), limits.ms);
    asked.on('error', (error) => stop(error instanceof NotFetched ? error.because : 'connection'));
    asked.on('response', (answer) => {
      if (answer.statusCode !== 200) return stop('status');
      const parts: Buffer[] = [];
      let bytes = 0;
      answer.on('data', (part: Buffer) => {
        bytes += part.length;
        if (bytes > limits.bytes) stop('size');
        else parts.push(part);
      });
      answer.on('error', () => stop('connection'));
      answer.on('aborted', () => stop('connection'));
      answer.on('end', () => {
        clearTimeout(timer);
        resolve(Buffer.concat(parts).toString('utf8'));
      });
    });
    asked.end();
  });
}

function faultOf(url: URL, { mayBeInner }: Outside): NotFetched['because'] | null {
  if (url.username || url.password || !['https:', 'http:'].includes(url.protocol)) return 'address';
  if (mayBeInner) return null;
  if (url.protocol !== 'https:') return 'address';
  const port = Number(url.port || 443);
  if (port !== 443 && port < 1024) return 'address';
  // A host that is an address already is never looked up.
  const literal = url.hostname.replace(/^\[|\]$/g, '');
  return isIP(literal) !== 0 && isInner(literal) ? 'inner' : null;
}

/** Looks a name up and refuses it when any of its addresses is inner. */
const judgedLookup =
  ({ mayBeInner, lookUp: find = lookUpAll }: Outside): LookupFunction =>
  (host, options, done) => {
    find(host, (error, found) => {
      const [first] = found;
      if (error || !first) return done(error ?? new NotFetched('connection'), []);
      if (!mayBeInner && found.some(({ address }) => isInner(address))) return done(new NotFetched('inner'), []);
      if (options.all) done(null, found);
      else done(null, first.address, first.family);
    });
  };

const lookUpAll: NonNullable<Outside['lookUp']> = (host, done) => {
  lookUp(host, { all: true }, (error, found) => done(error, found ?? []));
};
