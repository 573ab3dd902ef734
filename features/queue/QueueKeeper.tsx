import { useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { useRoom } from '@/hooks/useRoom';
import { queue } from './queue';

/** Sends what waits whenever that may work: on opening, when the signal is back, when the phone is taken up again. */
export function QueueKeeper() {
  const { accountId } = useRoom();
  const cache = useQueryClient();
  useEffect(() => void queue.open(accountId), [accountId]);
  useEffect(
    () =>
      queue.onArrival((roomIds) => {
        for (const roomId of roomIds) void cache.invalidateQueries({ queryKey: [roomId] });
      }),
    [cache],
  );
  useEffect(() => {
    const end = new AbortController();
    const send = () => void queue.drain();
    const seen = () => document.visibilityState === 'visible' && send();
    globalThis.addEventListener?.('online', send, { signal: end.signal });
    globalThis.document?.addEventListener('visibilitychange', seen, { signal: end.signal });
    return () => end.abort();
  }, []);
  return null;
}
