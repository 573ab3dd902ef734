const HOURLY_MS = 3_600_000;

/** Keeps the app's own files on the device, in production builds; tells when another version is ready to be taken. */
export function watchForUpdate(ready: (take: () => void) => void): () => void {
  const workers = globalThis.navigator?.serviceWorker;
  if (process.env.NODE_ENV !== 'production' || !workers) return () => {};
  const end = new AbortController();
  void register(workers, ready, end.signal).catch(() => {
    // Private windows may refuse: the app works with a signal only.
  });
  return () => end.abort();
}

async function register(workers: ServiceWorkerContainer, ready: (take: () => void) => void, signal: AbortSignal) {
  const registration = await workers.register('/sw.js', { updateViaCache: 'none' });
  const offer = (waiting: ServiceWorker) => {
    // The first version of all just begins to serve; there is nothing to choose.
    if (!workers.controller) return;
    ready(() => {
      workers.addEventListener('controllerchange', () => globalThis.location.reload(), { once: true });
      waiting.postMessage('take over');
    });
  };
  if (registration.waiting) offer(registration.waiting);
  const found = () => {
    const next = registration.installing;
    next?.addEventListener('statechange', () => next.state === 'installed' && offer(next), { signal });
  };
  registration.addEventListener('updatefound', found, { signal });
  const look = setInterval(() => void registration.update().catch(() => {}), HOURLY_MS);
  signal.addEventListener('abort', () => clearInterval(look));
}
