import { useEffect, useEffectEvent } from 'react';

const TYPING = 'input, textarea, select, [contenteditable=true], [role=dialog], [role=spinbutton]';

/** A single key that does something anywhere on the page, except while someone types or a dialog is open. */
export function useHotkey(key: string, act: (() => void) | undefined): void {
  const pressed = useEffectEvent((event: KeyboardEvent) => {
    if (!act || event.key.toLowerCase() !== key || event.ctrlKey || event.metaKey || event.altKey || event.repeat)
      return;
    if (document.querySelector('[aria-modal=true]')) return;
    if (event.target instanceof Element && event.target.closest(TYPING)) return;
    event.preventDefault();
    act();
  });
  useEffect(() => {
    if (typeof document === 'undefined') return;
    document.addEventListener('keydown', pressed);
    return () => document.removeEventListener('keydown', pressed);
  }, []);
}
