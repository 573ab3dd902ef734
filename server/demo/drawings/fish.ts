import type { Anatomy, Colouring, FinPaint } from './anatomy';
import { bodyOf, type Swelling } from './body';
import { type Chance, chanceOf } from './chance';
import { type Fin, fan, longFin, tailFin } from './fins';
import { paintCheek, paintEye, paintGill, paintMouth } from './head';
import { edges, outline, paintMarks } from './marks';
import { paintFin, paintTailRoot } from './paintFin';
import { type Pen, stroke } from './pen';
import { paintLateralLine, paintLight, paintScales, paintSkin } from './skin';

export type FishLook = {
  anatomy: Anatomy;
  colours: Colouring;
  /** The fish, not the picture: its own small differences stay with it from photo to photo. */
  individual: string;
  holding?: boolean;
  /** Still carries its yolk under the belly. */
  yolk?: boolean;
  /** Without scales and cheek: for fish far back. */
  plain?: boolean;
  /** 0 to 1: how far the fins are spread and the pectoral is lifted. */
  lift?: number;
};

/** What a mouth full of eggs does to the outline of the throat. */
const mouthful = (gill: number): Swelling => ({ from: 0.035, to: gill + 0.03, depth: 0.034 });

/** The yolk of a large egg hangs before the belly of the young fry. */
const YOLK: Swelling = { from: 0.17, to: 0.52, depth: 0.1 };

/** One fish, from the far fins to the near ones. */
export function paintFish(pen: Pen, look: FishLook): string {
  const { anatomy, colours } = look;
  const body = bodyOf(anatomy, look.holding ? mouthful(anatomy.gill) : look.yolk ? YOLK : undefined);
  const chance = (part: string): Chance => chanceOf(`${look.individual} ${part}`);
  const edge = outline(pen, body);
  const fin = (name: string, sheet: Fin, paint: FinPaint) => paintFin(pen, sheet, paint, chance(name));
  const tail = tailFin(body, anatomy.tail);
  const far = { ...anatomy.pelvic, x: anatomy.pelvic.x + 0.02, length: anatomy.pelvic.length * 0.94 };
  return [
    `<clipPath id="${pen.key}-body"><path d="${edge}"/></clipPath>`,
    fin('farpelvic', fan(body, far, 6), colours.pelvic),
    fin('dorsal', longFin(body, anatomy.dorsal, -1), colours.dorsal),
    fin('anal', longFin(body, anatomy.anal, 1), colours.anal),
    fin('tail', tail, colours.tail),
    `<g clip-path="url(#${pen.key}-body)">`,
    paintSkin(pen, body, colours),
    paintMarks(pen, body, colours.marks, chance('marks')),
    look.plain ? '' : paintScales(pen, body, colours, chance('scales')),
    look.yolk || look.plain ? '' : paintLateralLine(pen, body),
    paintCheek(pen, body, colours),
    paintGill(pen, body, look.holding ?? false),
    paintLight(pen, body),
    '</g>',
    stroke(edges(pen, body), '#06070b', pen.unit * 0.002, 0.4),
    paintTailRoot(pen, tail, colours),
    paintMouth(pen, body, colours),
    paintEye(pen, body, colours),
    fin('pelvic', fan(body, anatomy.pelvic), colours.pelvic),
    fin('pectoral', fan(body, anatomy.pectoral, look.lift ?? 0), colours.pectoral),
  ].join('');
}
