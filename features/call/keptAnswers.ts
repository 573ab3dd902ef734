import { experimental_createQueryPersister } from '@tanstack/react-query-persist-client';
import { isId } from '@/shared/ids';
import { answersStore } from './answersStore';
import { isReadLarge } from './largeLines';
import { forgetOpened } from './openedPages';

/** Older than this, what was seen of a fishroom misleads more than it helps. */
const KEPT_MS = 30 * 86_400_000;

/** Who is signed in: asked for under this key, kept under no account's name, since it tells whose the rest is. */
const WHO = 'kinwater-["me"]';

/** Whose answers are read and written. Everything else on the device is another person's and stays unread. */
let whose: string | null = null;

/** Said before any page of theirs asks for something: what another person saw here is wiped. */
export function keepFor(accountId: string | null): void {
  if (accountId === whose) return;
  const before = whose;
  whose = accountId;
  if (before !== null || accountId === null) void answersStore.clear();
}

/** The answers' shapes are those of one build: another build asks again. */
const build = (): string =>
  globalThis.document?.querySelector('script[src*="/entry-"]')?.getAttribute('src') ?? 'unbuilt';

const placeOf = (key: string) => (key === WHO ? key : `${whose}|${key}`);

/** Where a large answer is kept as it came; null while it is not known whose it would be. */
export const placeOfAnswer = (address: string): string | null => (whose === null ? null : placeOf(address));

/** Fetched data of fishrooms, per account, so that pages open without a signal to what was last seen. */
export const { persisterFn: keptAnswers } = experimental_createQueryPersister({
  prefix: 'kinwater',
  maxAge: KEPT_MS,
  // What was kept may be from before a record of a moment ago: it is shown at once, and always asked for again.
  refetchOnRestore: 'always',
  buster: build(),
  filters: {
    predicate: ({ queryKey: [first] }) => first === 'me' || (typeof first === 'string' && isId(first)),
  },
  // Large answers are kept by the worker that reads them.
  serialize: (asked) => (isReadLarge(asked.state.data) ? '' : JSON.stringify(asked)),
  storage: {
    getItem: async (key) => {
      const text = await answersStore.get(placeOf(key));
      if (key !== WHO || !text) return text;
      const accountId = accountIn(text);
      if (accountId) keepFor(accountId);
      return text;
    },
    setItem: async (key, text) => {
      if (text !== '' && (key !== WHO || accountIn(text))) await answersStore.put(placeOf(key), text);
    },
    removeItem: (key) => answersStore.remove(placeOf(key)),
  },
});

function accountIn(text: string): string | null {
  const id: unknown = JSON.parse(text)?.state?.data?.account?.id;
  return typeof id === 'string' ? id : null;
}

/** After a sign-out. */
export async function forgetAnswers(): Promise<void> {
  whose = null;
  forgetOpened();
  await answersStore.clear();
}
