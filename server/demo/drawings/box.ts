import { between, chanceOf } from './chance';
import { mix } from './colour';
import { linePath, point, smoothPath, steps } from './curve';
import { fill, glow, oval, round, softly, stroke } from './pen';

type Place = { w: number; h: number; waterY: number; floorY: number };

const BACKS = ['#c3cfd2', '#b9c8cf', '#cdd3cd', '#b4c4c6'];

const gradient = (id: string, from: string, to: string): string =>
  `<linearGradient id="${id}" x1="0" y1="0" x2="0" y2="1"><stop offset="0" stop-color="${from}"/><stop offset="1" stop-color="${to}"/></linearGradient>`;

/** The inside of a clear viewing box: a pale back pane, water with its surface, the light of a lamp above. */
export function paintBox({ w, h, waterY, floorY }: Place, shot: string): string {
  const chance = chanceOf(`${shot} box`);
  const back = BACKS[Math.floor(chance() * BACKS.length)] ?? '#c3cfd2';
  const lampX = w * between(chance, 0.25, 0.75);
  return [
    gradient('water', mix(back, '#ffffff', 0.24), mix(back, '#5f7d86', 0.42)),
    gradient('air', '#8e979b', '#aab4b8'),
    fill(`M0 0H${w}V${h}H0Z`, 'url(#water)'),
    glow('lamp', { x: lampX, y: waterY + h * 0.1, rx: w * 0.7, ry: h * 0.62 }, '#ffffff', 0.6),
    fill(`M0 0H${w}V${round(waterY)}H0Z`, 'url(#air)'),
    fill(`M0 ${round(floorY - h * 0.05)}H${w}V${h}H0Z`, mix(back, '#4c646b', 0.55), 0.55),
    fill(`M0 0H${round(w * 0.022)}V${h}H0Z`, '#6f868c', 0.5),
    fill(`M${round(w * 0.978)} 0H${w}V${h}H${round(w * 0.978)}Z`, '#6f868c', 0.5),
  ].join('');
}

/** What lies between the fish and the lens: the water's edge on the glass, bubbles, a faint reflection. */
export function paintGlass({ w, h, waterY, floorY }: Place, shot: string): string {
  const chance = chanceOf(`${shot} glass`);
  const ripple = steps(24).map((share) =>
    point(w * share, waterY + h * 0.0035 * Math.sin(share * 19 + chance() * 0.8)),
  );
  const bubbles = Array.from({ length: 9 }, () => {
    const centre = point(w * between(chance, 0.04, 0.96), between(chance, waterY + h * 0.02, floorY - h * 0.04));
    const r = h * between(chance, 0.0025, 0.006);
    return [
      stroke(smoothPath(oval(centre, r, r, 0, 12), true), '#ffffff', r * 0.3, 0.6),
      fill(
        smoothPath(oval(point(centre.x - r * 0.3, centre.y - r * 0.35), r * 0.28, r * 0.28, 0, 8), true),
        '#ffffff',
        0.9,
      ),
    ].join('');
  });
  const glareX = w * between(chance, 0.55, 0.85);
  const glare = (size: number) =>
    linePath(
      [
        point(glareX - w * 0.03 * size, 0),
        point(glareX + w * 0.03 * size, 0),
        point(glareX - w * (0.16 - 0.03 * size), h),
        point(glareX - w * (0.16 + 0.03 * size), h),
      ],
      true,
    );
  return [
    softly('wide', '#ffffff', 0.07, glare),
    ...bubbles,
    stroke(smoothPath(ripple), '#ffffff', h * 0.004, 0.75),
    stroke(smoothPath(ripple.map((p) => point(p.x, p.y + h * 0.006))), '#3d5158', h * 0.004, 0.35),
  ].join('');
}
