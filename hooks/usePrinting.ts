import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';

/** True while the browser lays the page out for paper. Drawn at once: the browser does not wait. */
export function usePrinting(): boolean {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    if (typeof window === 'undefined' || !window.addEventListener) return;
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => setPrinting(false);
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    return () => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
    };
  }, []);
  return printing;
}
