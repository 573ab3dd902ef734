import type { View } from 'react-native';

/** The first page keeps the browser's own focus order; after the first press every change of page is the keeper's. */
let acted: boolean | null = null;

function hasActed(): boolean {
  if (acted === null) {
    acted = false;
    const act = () => {
      acted = true;
    };
    document.addEventListener('click', act, { capture: true, once: true });
    document.addEventListener('keydown', act, { capture: true, once: true });
  }
  return acted;
}

/**
 * After a change of page the pressed link is gone and the focus with it: put it on the new page's heading, so that
 * the keyboard and a screen reader go on from there.
 */
export function focusLostHeading(root: View | null): void {
  const page: unknown = root;
  if (typeof HTMLElement === 'undefined' || !(page instanceof HTMLElement)) return;
  const nothingHasFocus = !document.activeElement || document.activeElement === document.body;
  if (hasActed() && nothingHasFocus) page.querySelector<HTMLElement>('h1')?.focus({ preventScroll: true });
}
