/** Pages that a person opened in a fishroom on this device, the last first: "brood:<id>". */
type Whose = { accountId: string; id: string };

const KEPT = 12;
const PREFIX = 'kinwater.opened.';
const keyOf = ({ accountId, id }: Whose) => `${PREFIX}${accountId}.${id}`;

/** Private windows may refuse storage: then nothing is remembered. */
const tried = <T>(act: () => T, otherwise: T): T => {
  try {
    return act();
  } catch {
    return otherwise;
  }
};

export const openedPages = (whose: Whose): string[] =>
  tried(() => (globalThis.localStorage?.getItem(keyOf(whose)) ?? '').split(',').filter(Boolean), []);

export function rememberOpened(whose: Whose, page: string): void {
  const pages = [page, ...openedPages(whose).filter((other) => other !== page)].slice(0, KEPT);
  tried(() => globalThis.localStorage?.setItem(keyOf(whose), pages.join(',')), undefined);
}

/** Of everyone who used this device: after a sign-out. */
export function forgetOpened(): void {
  tried(() => {
    const { localStorage } = globalThis;
    for (const key of Object.keys(localStorage ?? {})) if (key.startsWith(PREFIX)) localStorage.removeItem(key);
  }, undefined);
}
