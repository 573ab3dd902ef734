const KEY = 'kinwater.lastRoom';

/** The fishroom that this device showed last. Private windows may refuse storage: then nothing is remembered. */
export function lastRoom(): string | null {
  try {
    return globalThis.localStorage?.getItem(KEY) ?? null;
  } catch {
    return null;
  }
}

export function rememberRoom(roomId: string): void {
  try {
    globalThis.localStorage?.setItem(KEY, roomId);
  } catch {
    // Storage is refused: the next visit begins at the first fishroom.
  }
}
