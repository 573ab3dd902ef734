import { useEffect, useState } from 'react';

/** The value once it has stood still for so long: what is typed is asked for when the fingers rest. */
export function usePaused<T>(value: T, pauseMs: number): T {
  const [paused, setPaused] = useState(value);
  useEffect(() => {
    const later = setTimeout(() => setPaused(value), pauseMs);
    return () => clearTimeout(later);
  }, [value, pauseMs]);
  return paused;
}
