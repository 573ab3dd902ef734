import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useRoom } from '@/hooks/useRoom';
import { fetchNear } from './near';
import { queue } from './queue';
import { showHeld } from './showHeld';

/** After the page itself has what it needs. */
const SOON_MS = 2000;
const AGAIN_MS = 10 * 60_000;

/** Sends what waits whenever that may work, and keeps near what a form needs when there is no signal. */
export function QueueKeeper() {
  const { accountId, id: roomId } = useRoom();
  const cache = useQueryClient();
  useEffect(() => void queue.open(accountId), [accountId]);
  useEffect(
    () =>
      queue.onArrival((roomIds) => {
        for (const id of roomIds) void cache.invalidateQueries({ queryKey: [id] });
      }),
    [cache],
  );
  useEffect(() => {
    const fetchAhead = () => void fetchNear(cache, roomId).catch(() => {});
    const soon = setTimeout(fetchAhead, SOON_MS);
    const again = setInterval(fetchAhead, AGAIN_MS);
    return () => {
      clearTimeout(soon);
      clearInterval(again);
    };
  }, [cache, roomId]);
  useEffect(() => showHeld(cache, roomId), [cache, roomId]);
  useEffect(sendWhenSeen, []);
  return null;
}

/** When the signal is back, and when the phone is taken up again. */
function sendWhenSeen(): () => void {
  const end = new AbortController();
  const send = () => void queue.drain();
  const seen = () => document.visibilityState === 'visible' && send();
  globalThis.addEventListener?.('online', send, { signal: end.signal });
  globalThis.document?.addEventListener('visibilitychange', seen, { signal: end.signal });
  return () => end.abort();
}
