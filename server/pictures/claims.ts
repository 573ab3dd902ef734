import type { PictureKey, Shelf } from './shelf';

/** One request's hold on a stored picture, until its row is committed or given up. */
export type Claim = { keep(): void; discard(): Promise<void> };

/**
 * Two requests may bring the same picture at once (a phone that sends again). Each holds it; only the last to give up takes
 * the files away, and only if nobody has kept them and they were not there before.
 */
export function openClaims(shelf: Shelf) {
  const held = new Map<string, { holders: number; kept: boolean }>();

  return (key: PictureKey): Claim => {
    const name = `${key.roomId}/${key.id}`;
    const claim = held.get(name) ?? { holders: 0, kept: shelf.holds(key) };
    claim.holders += 1;
    held.set(name, claim);
    let settled = false;
    /** True when nobody else holds it. Must decide and take away in one turn of the event loop. */
    const letGo = (): boolean => {
      if (settled) return false;
      settled = true;
      claim.holders -= 1;
      if (claim.holders === 0) held.delete(name);
      return claim.holders === 0;
    };
    return {
      keep: () => {
        claim.kept = true;
        letGo();
      },
      discard: async () => {
        if (letGo() && !claim.kept) await shelf.remove(key);
      },
    };
  };
}
