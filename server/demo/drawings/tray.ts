import { between, type Chance, chanceOf } from './chance';
import { point, smoothPath } from './curve';
import { type Description, type Drawing, spanFor, type TrayDescription } from './description';
import { paintEgg, paintLarva } from './larva';
import { fill, glow, oval, type Pen, round, stroke } from './pen';
import { paintRuler } from './ruler';
import { DRAWN } from './species';

type Area = { left: number; top: number; right: number; bottom: number };

/** Places that keep clear of each other: best of some tries, so that a crowded tray still finds room. */
function scatter(count: number, area: Area, clear: number, chance: Chance): { x: number; y: number }[] {
  const places: { x: number; y: number }[] = [];
  for (let i = 0; i < count; i++) {
    let best = { x: 0, y: 0, gap: -1 };
    for (let tries = 0; tries < 24 && best.gap < clear; tries++) {
      const x = between(chance, area.left, area.right);
      const y = between(chance, area.top, area.bottom);
      const gap = Math.min(clear, ...places.map((other) => Math.hypot(other.x - x, (other.y - y) * 1.25)));
      if (gap > best.gap) best = { x, y, gap };
    }
    places.push({ x: best.x, y: best.y });
  }
  return places;
}

function paintTrayFloor(size: Description['size'], chance: Chance): string {
  const { w, h } = size;
  const swirl = Array.from({ length: 14 }, () => {
    const centre = point(w * chance(), h * chance());
    const [rx, ry] = [w * between(chance, 0.05, 0.12), h * between(chance, 0.03, 0.09)];
    return stroke(smoothPath(oval(centre, rx, ry, chance() * 3, 14), true), '#ffffff', h * 0.006, 0.12);
  });
  const lampAt = point(w * between(chance, 0.2, 0.8), h * between(chance, 0.05, 0.25));
  return [
    '<linearGradient id="tray" x1="0" y1="0" x2="0.3" y2="1"><stop offset="0" stop-color="#e6e9e6"/><stop offset="1" stop-color="#b9c3c4"/></linearGradient>',
    fill(`M0 0H${w}V${h}H0Z`, '#8f9a9d'),
    `<rect x="${round(w * 0.018)}" y="${round(h * 0.022)}" width="${round(w * 0.964)}" height="${round(h * 1.2)}" rx="${round(h * 0.07)}" fill="url(#tray)"/>`,
    glow('lamp', { ...lampAt, rx: w * 0.5, ry: h * 0.42 }, '#ffffff', 0.7),
    ...swirl,
  ].join('');
}

/** A group of eggs or fry from above, over a pale floor, with a ruler along the front edge. */
export function drawTray(tray: TrayDescription): Drawing {
  const { size, species, life, lengthMm, count } = tray;
  const drawn = DRAWN[species];
  const chance = chanceOf(`${tray.shot} ${species} tray`);
  // A group needs room: each animal about three times its own area.
  const span = tray.spanMm ?? spanFor(lengthMm * Math.sqrt(count) * 1.5, 1);
  const pxPerMm = size.w / span;
  const unit = lengthMm * pxPerMm;
  const rulerTop = size.h * 0.875;
  const edge = unit * 0.62;
  const area = {
    left: size.w * 0.03 + edge,
    right: size.w * 0.97 - edge,
    top: size.h * 0.04 + edge,
    bottom: rulerTop - edge,
  };
  const places = scatter(count, area, unit * 0.95, chance);
  const animals = places.map((at, i) => {
    const turn = between(chance, 0, 2 * Math.PI);
    const grown = life === 'eggs' ? between(chance, 0.95, 1.04) : between(chance, 0.9, 1.06);
    const pen: Pen = {
      key: `t${i}`,
      unit: unit * grown,
      place: (p) =>
        point(
          at.x + ((p.x - 0.5) * Math.cos(turn) - p.y * Math.sin(turn)) * unit * grown,
          at.y + ((p.x - 0.5) * Math.sin(turn) + p.y * Math.cos(turn)) * unit * grown,
        ),
    };
    return life === 'eggs'
      ? paintEgg(pen, drawn.egg.colour, chance)
      : paintLarva(pen, { drawn, yolk: life === 'yolk-fry', bend: between(chance, -1, 1) }, chance);
  });
  const ruler = { zeroX: size.w * 0.05, topY: rulerTop };
  return {
    size,
    backdrop: paintTrayFloor(size, chance),
    subject: animals.join(''),
    front: paintRuler({ ...ruler, height: size.h - rulerTop, width: size.w, pxPerMm }),
    pxPerMm,
    ruler,
  };
}
