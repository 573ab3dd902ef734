import { useEffect, useRef, useState } from 'react';
import { useUrlWord } from './useUrlWord';

const PAUSE_MS = 300;

/** A search or filter over much: it counts at once, the address follows when the keeper pauses. */
export function useSearchWord(key: string): [string, (word: string) => void] {
  const [kept, keep] = useUrlWord<string>(key, '');
  const [typed, setTyped] = useState(kept);
  const written = useRef(kept);
  const later = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(later.current), []);
  useEffect(() => {
    // Changed from elsewhere: by going back, or by a link.
    if (kept === written.current) return;
    written.current = kept;
    setTyped(kept);
  }, [kept]);
  const change = (word: string) => {
    setTyped(word);
    clearTimeout(later.current);
    later.current = setTimeout(() => {
      written.current = word;
      keep(word);
    }, PAUSE_MS);
  };
  return [typed, change];
}
