/** What was typed and not yet saved, as this device keeps it. */
export type StoredDraft = {
  at: string;
  values: Record<string, unknown>;
  /** What the form is called, and its address with what it is about. */
  title: string;
  href: string;
  /** A record that waits on this device and was opened here again: saved, it takes its own place. */
  again?: { entryId: string; ids: [what: string, id: string][] };
};

type Whose = { id: string; accountId: string };

const PREFIX = 'kinwater.draft.';
/** A draft older than this is forgotten: nobody remembers what was seen that day. */
const KEPT_MS = 14 * 86_400_000;

/** Drafts are a person's own: another account at this device does not see them. */
export const draftKey = ({ id, accountId }: Whose, name: string): string => `${PREFIX}${accountId}.${id}.${name}`;

export function readDraft(key: string): StoredDraft | null {
  try {
    const stored: unknown = JSON.parse(globalThis.localStorage?.getItem(key) ?? 'null');
    if (!isDraft(stored) || Date.now() - Date.parse(stored.at) > KEPT_MS) return null;
    return stored;
  } catch {
    return null;
  }
}

const isDraft = (stored: unknown): stored is StoredDraft =>
  typeof stored === 'object' && stored !== null && ['at', 'values', 'title', 'href'].every((part) => part in stored);

/** Everything that this person has begun in the fishroom and not saved, the latest first. */
export function draftsOf(whose: Whose): (StoredDraft & { key: string })[] {
  const stem = draftKey(whose, '');
  try {
    return Object.keys(globalThis.localStorage ?? {})
      .filter((key) => key.startsWith(stem))
      .flatMap((key) => {
        const draft = readDraft(key);
        return draft ? [{ ...draft, key }] : [];
      })
      .sort((a, b) => (a.at < b.at ? 1 : -1));
  } catch {
    return [];
  }
}

/** Private windows may refuse storage: then the draft lives as long as the page. */
export function writeDraft(key: string, draft: Omit<StoredDraft, 'at'>): void {
  try {
    globalThis.localStorage?.setItem(key, JSON.stringify({ at: new Date().toISOString(), ...draft }));
  } catch {
    // Storage is full or refused.
  }
}

export function dropDraft(key: string): void {
  try {
    globalThis.localStorage?.removeItem(key);
  } catch {
    // Storage is refused: there was no draft.
  }
}
