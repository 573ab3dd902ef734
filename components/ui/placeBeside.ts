const EDGE = 8;

type Place = { position: 'absolute'; left: number; top?: number; bottom?: number; maxHeight: number };

/** Under the button, or above it where there is more room; within the window either way. */
export function placeBeside(
  anchor: HTMLElement | null,
  window: { width: number; height: number },
  width: number,
): Place | null {
  if (!anchor) return null;
  const box = anchor.getBoundingClientRect();
  const left = Math.max(EDGE, Math.min(box.left, window.width - width - EDGE));
  const below = window.height - box.bottom - 2 * EDGE;
  const above = box.top - 2 * EDGE;
  if (below >= 320 || below >= above)
    return { position: 'absolute', left, top: box.bottom + EDGE / 2, maxHeight: Math.max(200, below) };
  return { position: 'absolute', left, bottom: window.height - box.top + EDGE / 2, maxHeight: Math.max(200, above) };
}
