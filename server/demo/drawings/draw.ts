import type { Drawn } from './anatomy';
import { bodyOf, flank } from './body';
import { paintBox, paintGlass } from './box';
import { between, chanceOf } from './chance';
import { mix } from './colour';
import { point } from './curve';
import { type Description, type Drawing, type FishDescription, spanFor } from './description';
import { paintFish } from './fish';
import { lookOf } from './looks';
import { fill, smoothRing, softly } from './pen';
import { penFor, tiltOf } from './pose';
import { paintRuler } from './ruler';
import { DRAWN, type DrawnSpecies } from './species';
import { OPEN, paintTank, paintWaterBefore, REEF, ROCKY, SANDY, type Scenery } from './tank';
import { drawTray } from './tray';

const SCENERY: Record<DrawnSpecies, Scenery> = {
  'altolamprologus-calvus': ROCKY,
  'cyprichromis-leptosoma': OPEN,
  'cyrtocara-moorii': { ...SANDY, water: REEF.water },
  'enantiopus-melanogenys': SANDY,
  'eretmodus-cyanostictus': ROCKY,
  'labidochromis-caeruleus': REEF,
  'maylandia-estherae': REEF,
  'tropheus-moorii': ROCKY,
};

/** A fish against the back pane of a viewing box, square to the lens, over a ruler at its own scale. */
function drawInBox(fish: FishDescription): Drawing {
  const drawn: Drawn = DRAWN[fish.species];
  const { w, h } = fish.size;
  const chance = chanceOf(`${fish.shot} place`);
  const pxPerMm = w / (fish.spanMm ?? spanFor(fish.lengthMm, 0.78));
  const unit = fish.lengthMm * pxPerMm;
  const box = { w, h, waterY: h * 0.075, floorY: h * 0.86 };
  const x = (w - unit) * between(chance, 0.42, 0.58);
  const y = h * between(chance, 0.45, 0.49);
  const pen = penFor({ key: 'fish', x, y, unit, pose: fish.pose, tilt: 0 });
  const look = lookOf(drawn, fish);
  const outline = flank(bodyOf(look.anatomy), -1, 1).map((p) => point(p.x + 0.03, p.y + 0.045));
  const shadow = (size: number) =>
    smoothRing(
      pen,
      outline.map((p) => point(p.x, p.y * size)),
    );
  const ruler = { zeroX: w * 0.05, topY: box.floorY };
  return {
    size: fish.size,
    backdrop: paintBox(box, fish.shot) + softly('wide', '#2c4149', 0.28, shadow),
    subject: paintFish(pen, look),
    front: paintGlass(box, fish.shot) + paintRuler({ ...ruler, height: h - box.floorY, width: w, pxPerMm }),
    pxPerMm,
    ruler,
  };
}

/** Fish that stay near the ground. */
const LOW: ReadonlySet<DrawnSpecies> = new Set(['enantiopus-melanogenys', 'eretmodus-cyanostictus']);

/** Others of the species further back, dimmed by the water between. */
function companions(fish: FishDescription, scenery: Scenery, unit: number): string {
  const { w, h } = fish.size;
  const chance = chanceOf(`${fish.shot} companions`);
  const drawn: Drawn = DRAWN[fish.species];
  return Array.from({ length: fish.companions ?? 0 }, (_, i) => {
    const far = between(chance, 0.42, 0.7);
    const life = fish.life === 'male' || fish.life === 'female' ? (chance() < 0.3 ? 'male' : 'female') : fish.life;
    const other: FishDescription = { ...fish, life, individual: `${fish.shot} ${i}`, holding: false };
    const look = lookOf(drawn, other);
    const haze = (colour: string) => mix(colour, mix(scenery.water[0], scenery.water[1], 0.55), 0.62 - 0.4 * far);
    const colours = {
      ...look.colours,
      tones: look.colours.tones.map(([v, colour]) => [v, haze(colour)] as const),
      sparkleCover: 0.05,
    };
    const pose = chance() < 0.5 ? 'left' : 'right';
    const place = {
      x: w * between(chance, -0.05, 0.85),
      y: h * between(chance, LOW.has(fish.species) ? scenery.floor - 0.22 : 0.14, scenery.floor - 0.12),
    };
    const pen = penFor({ key: `far${i}`, ...place, unit: unit * far, pose, tilt: between(chance, -9, 9) });
    return `<g opacity="0.86">${paintFish(pen, { ...look, colours, plain: true })}</g>`;
  }).join('');
}

function drawInTank(fish: FishDescription): Drawing {
  const drawn: Drawn = DRAWN[fish.species];
  const scenery = SCENERY[fish.species];
  const { w, h } = fish.size;
  const chance = chanceOf(`${fish.shot} place`);
  const unit = w * (0.36 + 0.26 * Math.min(1, fish.lengthMm / drawn.adultMm) ** 0.6);
  const x = (w - unit) * between(chance, 0.3, 0.7);
  const low = LOW.has(fish.species);
  const y = h * (low ? scenery.floor - 0.12 : between(chance, 0.44, 0.54));
  const pen = penFor({ key: 'fish', x, y, unit, pose: fish.pose, tilt: low ? tiltOf(fish) / 3 : tiltOf(fish) });
  const under = point(x + unit * 0.45, Math.max(y + unit * 0.2, h * (scenery.floor + 0.06)));
  const shade = (size: number) =>
    smoothRing(
      { ...pen, place: (p) => p },
      [0, 1, 2, 3, 4, 5, 6, 7].map((i) => {
        const angle = (i / 8) * 2 * Math.PI;
        return point(under.x + unit * 0.34 * size * Math.cos(angle), under.y + unit * 0.045 * size * Math.sin(angle));
      }),
    );
  return {
    size: fish.size,
    backdrop:
      paintTank(fish.size, scenery, fish.shot) +
      softly('wide', '#04121a', 0.35, shade) +
      companions(fish, scenery, unit),
    subject: paintFish(pen, lookOf(drawn, fish)),
    front: paintWaterBefore(fish.size, scenery, fish.shot) + fill(`M0 0H${w}V${h}H0Z`, scenery.water[0], 0.07),
    pxPerMm: unit / fish.lengthMm,
    ruler: null,
  };
}

/** A picture drawn from its description alone: the same description gives the same picture, byte for byte. */
export function draw(description: Description): Drawing {
  if (description.setting === 'tray') return drawTray(description);
  return description.setting === 'box' ? drawInBox(description) : drawInTank(description);
}

type Layers = readonly ('backdrop' | 'subject' | 'front')[];

/** Some layers of a drawing, or all of them, as an SVG document of the drawing's size or scaled. */
export function svgOf(drawing: Drawing, layers: Layers = ['backdrop', 'subject', 'front'], scale = 1): string {
  const { w, h } = drawing.size;
  const inside = layers.map((layer) => drawing[layer]).join('');
  const [width, height] = [Math.round(w * scale), Math.round(h * scale)];
  return `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${w} ${h}">${inside}</svg>`;
}
