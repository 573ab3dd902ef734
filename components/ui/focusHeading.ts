import type { View } from 'react-native';

/**
 * After a change of page the pressed link is gone and the focus with it: put it on the new page's heading, so that
 * the keyboard and a screen reader go on from there.
 */
export function focusLostHeading(root: View | null): void {
  const page: unknown = root;
  if (typeof HTMLElement === 'undefined' || !(page instanceof HTMLElement)) return;
  const nothingHasFocus = !document.activeElement || document.activeElement === document.body;
  if (nothingHasFocus && hasNavigated()) page.querySelector<HTMLElement>('h1')?.focus({ preventScroll: true });
}

let firstPage: string | null = null;

/** The first page keeps the browser's own focus order. */
function hasNavigated(): boolean {
  firstPage ??= window.location.href;
  return firstPage !== window.location.href;
}
