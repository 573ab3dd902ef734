import { useSyncExternalStore } from 'react';

const listen = (changed: () => void) => {
  globalThis.addEventListener?.('online', changed);
  globalThis.addEventListener?.('offline', changed);
  return () => {
    globalThis.removeEventListener?.('online', changed);
    globalThis.removeEventListener?.('offline', changed);
  };
};

/** False when the device itself says that it has no network. True promises nothing. */
export const useOnline = (): boolean =>
  useSyncExternalStore(
    listen,
    () => globalThis.navigator?.onLine !== false,
    () => true,
  );
