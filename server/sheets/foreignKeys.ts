import { Refusal } from '../../shared/refusal';
import {
  keysAddress,
  type PublicJwk,
  parsed,
  type Recalled,
  readKeySet,
  readRecalled,
} from '../../shared/sheets/sheetFile';
import { fetchOutside, NotFetched } from '../http/fetchOutside';
import type { Asked } from '../scope';
import { publishedKeys } from './keys';

export type PublishedKeys = { keys: PublicJwk[]; recalled: Recalled[] };

export const WHY_NOT_FETCHED: Record<NotFetched['because'], string> = {
  address: 'Only addresses that begin with https:// are asked.',
  inner: 'It leads into a private network, and those are not asked.',
  status: 'It answered, but not with keys.',
  size: 'It sent far more than keys take.',
  time: 'It took too long to answer.',
  connection: 'Nothing answers there.',
};

/** The keys published at an address. Our own are read where they are kept; of others only what is a key is handed on. */
export async function fetchedKeys({ db, house }: Pick<Asked, 'db' | 'house'>, at: string): Promise<PublishedKeys> {
  const [, ours] = /\/keys\/([0-9a-f-]{36})\.json$/.exec(at) ?? [];
  if (ours && at === keysAddress(house.config.origin, ours)) return publishedKeys({ db, roomId: ours });
  const text = await fetchOutside(at, { mayBeInner: house.config.innerKeys }).catch((error: unknown) => {
    if (error instanceof NotFetched) throw notReached(at, WHY_NOT_FETCHED[error.because]);
    throw error;
  });
  const value = parsed(text);
  const keys = readKeySet(value);
  if (!keys) throw notReached(at, WHY_NOT_FETCHED.status);
  return { keys, recalled: readRecalled(value) };
}

const notReached = (at: string, why: string) =>
  new Refusal('invalid', `The keys at ${at} could not be fetched. ${why} Paste the fishroom’s keys instead.`, {
    at: why,
  });
