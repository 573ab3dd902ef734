import type { View } from 'react-native';

/** The page's element behind a view; null off the web and before it is drawn. */
export function elementOf(view: View | null): HTMLElement | null {
  const element: unknown = view;
  return typeof HTMLElement !== 'undefined' && element instanceof HTMLElement ? element : null;
}
