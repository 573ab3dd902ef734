import { createHash } from 'node:crypto';
import * as z from 'zod/mini';
import { Refusal } from '../../shared/refusal';
import { claimOf, type SheetVerdict } from '../../shared/sheets/checkSheet';
import type { SheetContent } from '../../shared/sheets/content';
import type { SheetSource, Trust } from '../../shared/sheets/importContract';
import { Jws, keysAddress, parsed, type Recalled } from '../../shared/sheets/sheetFile';
import { verdictWords } from '../../shared/sheets/verdictWords';
import { Address } from '../../shared/sheets/wording';
import { fetchOutside, NotFetched } from '../http/fetchOutside';
import type { Scope } from '../scope';
import { fetchedKeys, type PublishedKeys, WHY_NOT_FETCHED } from './foreignKeys';
import { byToken } from './publicSheet';
import { signatures, verifySheet } from './signing';

/** A sheet as it came, with how far it can be trusted. */
export type SheetRead = { jws: string; content: SheetContent; trust: Trust; recalled: Recalled | null };

/** Gets a sheet from its file or its address and checks it. Asks other installations: never within a transaction. */
export async function readSource(scope: Scope, source: SheetSource): Promise<SheetRead> {
  const { jws, keysAt, pasted } =
    source.from === 'file'
      ? { jws: source.jws, keysAt: source.keysAt, pasted: source.keys }
      : { ...(await sheetAt(scope, source.at)), pasted: null };
  const claim = claimOf(jws, signatures);
  if (!claim) return refuse({ state: 'notASheet', because: 'content' });
  // A fishroom of this installation is checked by the keys that are kept here, whatever came with the sheet.
  const ours = await isHere(scope, claim.fishroom.id);
  const at = ours ? keysAddress(scope.house.config.origin, claim.fishroom.id) : keysAt;
  if (pasted && !ours)
    return judge(jws, claim, { published: { keys: pasted, recalled: [] }, at: null, from: 'pasted' });
  const published = await publishedAt(scope, at);
  if (typeof published === 'string') return unchecked(jws, claim, published);
  return judge(jws, claim, { published, at, from: ours ? 'here' : 'address' });
}

type Found = { published: PublishedKeys; at: string | null; from: 'here' | 'address' | 'pasted' };

async function judge(jws: string, claim: SheetContent, { published, at, from }: Found): Promise<SheetRead> {
  const verdict = await verifySheet(jws, { keys: published.keys, at });
  if (verdict.state === 'unknownKey') {
    if (from === 'here') refuse({ state: 'badSignature', because: 'otherKey' });
    return unchecked(jws, claim, verdictWords(verdict).text);
  }
  if (verdict.state !== 'valid') return refuse(verdict);
  const digest = createHash('sha256').update(jws).digest('base64url');
  return {
    jws,
    content: verdict.content,
    trust: { signature: 'valid', keysFrom: from, keyId: verdict.keyId, why: null },
    recalled: published.recalled.find(({ sheet }) => sheet === digest) ?? null,
  };
}

const unchecked = (jws: string, content: SheetContent, why: string): SheetRead => ({
  jws,
  content,
  trust: { signature: 'keyUnknown', keysFrom: null, keyId: null, why },
  recalled: null,
});

/** What is not what its fishroom signed is not taken in, and the reason is told. */
function refuse(verdict: Exclude<SheetVerdict, { state: 'valid' }>): never {
  const { title, text } = verdictWords(verdict);
  throw new Refusal('invalid', `${title}. ${text}`, { source: text });
}

async function publishedAt(scope: Scope, at: string | null): Promise<PublishedKeys | string> {
  if (!at) return 'The file does not say where its keys are. Paste the fishroom’s keys, or ask for its address.';
  return fetchedKeys(scope, at).catch((error: unknown) => {
    if (error instanceof Refusal) return error.message;
    throw error;
  });
}

async function isHere({ db }: Scope, roomId: string): Promise<boolean> {
  // Any fishroom of the installation: its id is on the sheet, and nothing else of it is read.
  return (await db.selectFrom('room').where('id', '=', roomId).select('id').executeTakeFirst()) !== undefined;
}

const SheetAnswer = z.object({ jws: Jws, keysAt: Address });
const LARGEST = { bytes: 24_000_000, ms: 15_000 };

/** A sheet by its check page: of ours it is read, of another installation it is asked for. */
async function sheetAt(scope: Scope, address: string): Promise<{ jws: string; keysAt: string | null }> {
  const { origin, innerKeys } = scope.house.config;
  const [, from = '', token = ''] = /^(.*)\/sheet\/([\w-]{22})\/?$/.exec(address) ?? [];
  if (from.toLowerCase() === origin.toLowerCase()) {
    const { jws } = await byToken(scope.db, token).catch(() => {
      throw notThere('There is no sheet at that address.');
    });
    return { jws, keysAt: null };
  }
  const text = await fetchOutside(`${from}/api/sheets/${token}`, { mayBeInner: innerKeys }, LARGEST).catch(
    (error: unknown) => {
      if (error instanceof NotFetched)
        throw notThere(
          error.because === 'status' ? 'There is no sheet at that address.' : WHY_NOT_FETCHED[error.because],
        );
      throw error;
    },
  );
  const answer = SheetAnswer.safeParse(parsed(text));
  if (!answer.success) throw notThere('What answers there is not a lineage sheet.');
  return answer.data;
}

const notThere = (why: string) =>
  new Refusal('invalid', `The sheet could not be fetched. ${why} Choose its file instead.`, { source: why });
