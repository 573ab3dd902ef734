/** Where a drawing stands in its window: its top left corner, and how large. */
export type View2d = { x: number; y: number; k: number };
export type Box2d = { width: number; height: number };

export const LEAST_ZOOM = 0.15;
export const MOST_ZOOM = 3;

const clamp = (value: number, least: number, most: number) => Math.min(most, Math.max(least, value));

/** Larger or smaller about a point of the window, which stays where it is. */
export function zoomedAt(view: View2d, factor: number, at: { x: number; y: number }): View2d {
  const k = clamp(view.k * factor, LEAST_ZOOM, MOST_ZOOM);
  const by = k / view.k;
  return { k, x: at.x - (at.x - view.x) * by, y: at.y - (at.y - view.y) * by };
}

/** All of the drawing in the window, in the middle; no larger than `most`, and not below `least` where words end. */
export function fitted(drawing: Box2d, window: Box2d, { least = LEAST_ZOOM, most = 1.4, pad = 8 } = {}): View2d {
  const k = clamp(
    Math.min(
      (window.width - 2 * pad) / Math.max(1, drawing.width),
      (window.height - 2 * pad) / Math.max(1, drawing.height),
    ),
    least,
    most,
  );
  return { k, x: (window.width - drawing.width * k) / 2, y: Math.max(pad, (window.height - drawing.height * k) / 2) };
}

/** Keeps a strip of the drawing within the window, so that it cannot be lost. */
export function kept(view: View2d, drawing: Box2d, window: Box2d): View2d {
  const strip = 48;
  return {
    k: view.k,
    x: clamp(view.x, strip - drawing.width * view.k, window.width - strip),
    y: clamp(view.y, strip - drawing.height * view.k, window.height - strip),
  };
}

/** Moves a point of the drawing to the middle of the window. */
export function centredOn(view: View2d, point: { x: number; y: number }, window: Box2d): View2d {
  return { k: view.k, x: window.width / 2 - point.x * view.k, y: window.height / 2 - point.y * view.k };
}
