import type { Colouring, Drawn, FinPaint } from './anatomy';
import { anatomyAt } from './body';
import { mix } from './colour';
import type { FishDescription } from './description';
import type { FishLook } from './fish';

/** Young fry are glassy: thin skin over flesh, clear fins, hardly a scale. */
function fryColours(drawn: Drawn, yolk: boolean): Colouring {
  const young = drawn.colours.juvenile;
  const clear = (paint: FinPaint): FinPaint => ({
    root: mix(paint.root, '#d8cdb8', 0.6),
    edge: '#e8e4da',
    rootCover: 0.5,
    edgeCover: 0.24,
    rayColour: '#7a7264',
    rayCover: 0.35,
  });
  const share = yolk ? 0.66 : 0.34;
  return {
    ...young,
    tones: young.tones.map(([v, colour]) => [v, mix(colour, v < 0 ? '#a89678' : '#dccdb4', share)] as const),
    marks: yolk
      ? [
          {
            kind: 'blotches',
            count: 26,
            size: 0.007,
            x: [0.1, 0.7],
            v: [-1, -0.3],
            colour: '#3a3026',
            cover: 0.45,
            soft: 'soft',
          },
          { kind: 'patch', x: 0.31, v: 0.62, rx: 0.15, rv: 0.6, colour: drawn.egg.colour, cover: 0.9, soft: 'soft' },
          { kind: 'patch', x: 0.28, v: 0.38, rx: 0.07, rv: 0.2, colour: '#fff0cc', cover: 0.5, soft: 'wide' },
        ]
      : young.marks.map((mark) => ({ ...mark, cover: mark.cover * 0.7 })),
    dorsal: clear(young.dorsal),
    anal: clear(young.anal),
    tail: clear(young.tail),
    pelvic: clear(young.pelvic),
    pectoral: { ...clear(young.pectoral), rootCover: 0.25, edgeCover: 0.1, rayCover: 0.2 },
    scaleEdge: yolk ? 0 : 0.08,
    sparkleCover: yolk ? 0 : 0.08,
    iris: '#b9b7a8',
    irisRim: '#54524a',
  };
}

/** How a described fish looks at its length. */
export function lookOf(drawn: Drawn, fish: FishDescription): FishLook {
  const anatomy = anatomyAt(drawn.anatomy, fish.lengthMm / drawn.adultMm);
  const young = fish.life === 'fry' || fish.life === 'yolk-fry';
  const colours =
    fish.life === 'fry' || fish.life === 'yolk-fry'
      ? fryColours(drawn, fish.life === 'yolk-fry')
      : drawn.colours[fish.life];
  return {
    anatomy: young ? { ...anatomy, pelvic: { ...anatomy.pelvic, length: anatomy.pelvic.length * 0.6 } } : anatomy,
    colours,
    individual: fish.individual,
    holding: fish.holding ?? false,
    yolk: fish.life === 'yolk-fry',
  };
}
