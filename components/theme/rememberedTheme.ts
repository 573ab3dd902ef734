import type { ThemeName } from './theme';

const KEY = 'kinwater.theme';

/** The theme this device chose before, if any. Private windows may refuse storage: then nothing is remembered. */
export function rememberedTheme(): ThemeName | null {
  try {
    const name = globalThis.localStorage?.getItem(KEY);
    return name === 'dark' || name === 'light' ? name : null;
  } catch {
    return null;
  }
}

export function rememberTheme(name: ThemeName): void {
  try {
    globalThis.localStorage?.setItem(KEY, name);
  } catch {
    // Storage is refused: the choice holds until the page closes.
  }
}

/** The page behind the app follows: its ground, focus ring, scroll bars and the browser's own bar. */
export function paintPage(name: ThemeName, ground: string): void {
  if (typeof document === 'undefined') return;
  document.documentElement.dataset['theme'] = name;
  document.querySelector('meta[name="theme-color"]')?.setAttribute('content', ground);
}
