import { useEffect } from 'react';

/** The browser's tab and history say where one is. */
export function usePageTitle(title: string): void {
  useEffect(() => {
    if (typeof document !== 'undefined') document.title = `${title} · Kinwater`;
  }, [title]);
}
