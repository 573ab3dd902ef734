import { type RefObject, useEffect, useEffectEvent, useState } from 'react';
import type { View, WebKeyEvent } from 'react-native';
import { type Box2d, fitted, kept, type View2d, zoomedAt } from './panZoom';

const DRAG_FROM = 5;
const STEP = 60;
const KEY_MOVES: Record<string, readonly [number, number]> = {
  ArrowLeft: [STEP, 0],
  ArrowRight: [-STEP, 0],
  ArrowUp: [0, STEP],
  ArrowDown: [0, -STEP],
};

/** Moves and sizes a drawing by finger, wheel, buttons and keys. `start` places it when the window is first known. */
export function usePanZoom(box: RefObject<View | null>, drawing: Box2d, window: Box2d, start: (fit: View2d) => View2d) {
  const [moved, setMoved] = useState<View2d | null>(null);
  const known = window.width > 0 && window.height > 0;
  const view = moved ?? (known ? start(fitted(drawing, window)) : { x: 0, y: 0, k: 1 });
  const set = (next: View2d) => setMoved(kept(next, drawing, window));
  const middle = { x: window.width / 2, y: window.height / 2 };
  const zoom = (factor: number) => set(zoomedAt(view, factor, middle));
  const whole = () => set(fitted(drawing, window));
  useGestures(box, {
    pan: (dx, dy) => set({ ...view, x: view.x + dx, y: view.y + dy }),
    zoom: (factor, at) => set(zoomedAt(view, factor, at)),
  });
  const onKeyDown = (event: WebKeyEvent) => {
    const move = KEY_MOVES[event.key];
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    if (move) set({ ...view, x: view.x + move[0], y: view.y + move[1] });
    else if (event.key === '+' || event.key === '=') zoom(1.25);
    else if (event.key === '-') zoom(0.8);
    else if (event.key === '0') whole();
    else return;
    event.preventDefault();
  };
  return { view, set, zoom, whole, onKeyDown };
}

type Gestures = {
  pan: (dx: number, dy: number) => void;
  zoom: (factor: number, at: { x: number; y: number }) => void;
};

type Point = { x: number; y: number };

/** Fingers, mouse and wheel on the page's element. A short press stays a press on what is under it. */
function useGestures(box: RefObject<View | null>, { pan, zoom }: Gestures): void {
  const onPan = useEffectEvent(pan);
  const onZoom = useEffectEvent(zoom);
  useEffect(() => {
    const node: unknown = box.current;
    if (typeof HTMLElement === 'undefined' || !(node instanceof HTMLElement)) return;
    const end = new AbortController();
    const fingers = new Map<number, Point>();
    let dragging = false;
    const here = (event: MouseEvent): Point => {
      const frame = node.getBoundingClientRect();
      return { x: event.clientX - frame.left, y: event.clientY - frame.top };
    };
    const down = (event: PointerEvent) => {
      if (event.button !== 0) return;
      if (fingers.size === 0) dragging = false;
      fingers.set(event.pointerId, here(event));
    };
    const move = (event: PointerEvent) => {
      const before = fingers.get(event.pointerId);
      if (!before) return;
      const now = here(event);
      if (!dragging && fingers.size === 1 && Math.hypot(now.x - before.x, now.y - before.y) < DRAG_FROM) return;
      dragging = true;
      const other = [...fingers].find(([id]) => id !== event.pointerId)?.[1];
      if (other) pinch(other, before, now, onZoom);
      else onPan(now.x - before.x, now.y - before.y);
      fingers.set(event.pointerId, now);
    };
    const up = (event: PointerEvent) => fingers.delete(event.pointerId);
    // After a drag the browser still sends a click to what the finger ends on.
    const click = (event: MouseEvent) => {
      if (!dragging) return;
      event.stopPropagation();
      event.preventDefault();
      dragging = false;
    };
    const wheel = (event: WheelEvent) => {
      event.preventDefault();
      onZoom(Math.exp(-event.deltaY * (event.ctrlKey ? 0.01 : 0.0015)), here(event));
    };
    node.addEventListener('pointerdown', down, { signal: end.signal });
    globalThis.addEventListener('pointermove', move, { signal: end.signal });
    globalThis.addEventListener('pointerup', up, { signal: end.signal });
    globalThis.addEventListener('pointercancel', up, { signal: end.signal });
    node.addEventListener('click', click, { signal: end.signal, capture: true });
    node.addEventListener('wheel', wheel, { signal: end.signal, passive: false });
    return () => end.abort();
  }, [box]);
}

function pinch(still: Point, before: Point, now: Point, zoom: Gestures['zoom']): void {
  const apart = (a: Point) => Math.max(1, Math.hypot(a.x - still.x, a.y - still.y));
  zoom(apart(now) / apart(before), { x: (now.x + still.x) / 2, y: (now.y + still.y) / 2 });
}
