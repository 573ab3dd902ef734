import type { WebKeyEvent } from 'react-native';

const STEPS: Record<string, number> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };

/**
 * Arrow keys, Home and End move the focus among the members of a group, as radios, tabs and menus do in a browser.
 * `press` also chooses the member; `columns` makes up and down jump a line of a grid; `upDown` leaves the other keys to
 * the text field among the members.
 */
export function moveFocus(
  event: WebKeyEvent,
  selector: string,
  how: { press?: boolean; columns?: number; upDown?: boolean } = {},
): void {
  if (how.upDown && event.key !== 'ArrowUp' && event.key !== 'ArrowDown') return;
  const group = event.currentTarget;
  if (typeof HTMLElement === 'undefined' || !(group instanceof HTMLElement)) return;
  const members = [...group.querySelectorAll<HTMLElement>(selector)].filter((m) => m.ariaDisabled !== 'true');
  const at = members.findIndex((member) => member.contains(document.activeElement));
  const to = nextIndex(event.key, at, members.length, how.columns ?? 1);
  const next = to === null ? undefined : members[to];
  if (!next) return;
  event.preventDefault();
  event.stopPropagation();
  next.focus();
  if (how.press) next.click();
}

function nextIndex(key: string, at: number, count: number, columns: number): number | null {
  if (key === 'Home') return 0;
  if (key === 'End') return count - 1;
  const step = STEPS[key];
  if (step === undefined || count === 0) return null;
  const jump = key === 'ArrowDown' || key === 'ArrowUp' ? step * columns : step;
  return (at + jump + count) % count;
}
