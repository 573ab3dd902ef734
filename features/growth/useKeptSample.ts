import { useState } from 'react';
import { useRoom } from '@/hooks/useRoom';
import type { SamplesOf } from './queries';

/** A sample that is being taken outlives the page: a dropped phone loses no length. */
export function useKeptSample({ thing, thingId }: SamplesOf) {
  const { id: roomId, accountId } = useRoom();
  const key = `kinwater.sample.${accountId}.${roomId}.${thing}.${thingId}`;
  const [lengths, setAll] = useState<number[]>(() => read(key));
  return {
    lengths,
    setLengths: (next: number[]) => {
      setAll(next);
      globalThis.localStorage?.setItem(key, JSON.stringify(next));
    },
    drop: () => globalThis.localStorage?.removeItem(key),
  };
}

function read(key: string): number[] {
  try {
    const stored: unknown = JSON.parse(globalThis.localStorage?.getItem(key) ?? '[]');
    return Array.isArray(stored) ? stored.filter((value) => typeof value === 'number') : [];
  } catch {
    return [];
  }
}
