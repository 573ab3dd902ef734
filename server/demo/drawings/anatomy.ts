import type { Knots } from './curve';
import type { Softness } from './pen';

/**
 * The build of a fish in shares of its total length: x runs from the snout (0) to the hind edge of the tail fin (1),
 * y from the axis of the body, downwards. Heights in knots are away from the axis.
 */
export type Anatomy = {
  /** Standard length as a share of total length: where the rays of the tail fin begin. */
  standard: number;
  back: Knots;
  belly: Knots;
  /** Height taken off the back while young, at the same places as `back`: a hump grows with age. */
  hump?: Knots;
  /** Hind edge of the gill cover. */
  gill: number;
  eye: { x: number; y: number; r: number };
  mouth: { y: number; length: number; drop: number; lip: number };
  dorsal: LongFin;
  anal: LongFin;
  tail: TailFin;
  pelvic: Fan;
  pectoral: Fan;
  scales: { columns: number; rows: number };
};

/** A fin along the back or belly. Heights and leans (degrees backwards from upright) are by share of its base. */
export type LongFin = {
  from: number;
  to: number;
  spines: number;
  rays: number;
  height: Knots;
  lean: Knots;
  /** How deep the membrane dips between spines, as a share of their height. */
  notch: number;
};

/** `fork` is how far the middle rays fall short of the outer ones; below zero the tail is rounded. */
export type TailFin = { span: number; fork: number; rays: number; lobe: number };

/** A paired fin: where it sits, how long, how it hangs (degrees below straight backwards) and spreads. */
export type Fan = { x: number; v: number; length: number; angle: number; spread: number; rays: number; point: number };

export type FinPaint = {
  root: string;
  edge: string;
  /** How much of what lies behind the fin is hidden, 0 to 1, at its base and at its edge. */
  rootCover: number;
  edgeCover: number;
  rayColour: string;
  rayCover: number;
  bands?: readonly FinBand[];
  spots?: readonly FinSpots[];
};
type FinBand = { from: number; to: number; start?: number; end?: number; colour: string; cover: number };
/** Rows of spots between two shares of the base (t) and of the height (s). */
export type FinSpots = {
  t: readonly [number, number];
  s: readonly [number, number];
  columns: number;
  rows: number;
  size: number;
  colour: string;
  cover: number;
  ring?: string;
};

/** v runs over the flank from -1 at the back to 1 at the belly. */
export type Mark = { colour: string; cover: number; soft: Softness } & (
  | { kind: 'bars'; at: readonly number[]; width: number; from: number; to: number; taper?: number }
  | { kind: 'stripe'; v: number; height: number; from: number; to: number }
  | {
      kind: 'spots';
      rows: number;
      columns: number;
      size: number;
      x: readonly [number, number];
      v: readonly [number, number];
    }
  | { kind: 'blotches'; count: number; size: number; x: readonly [number, number]; v: readonly [number, number] }
  | { kind: 'patch'; x: number; v: number; rx: number; rv: number }
);

export type Colouring = {
  /** From the back (-1) to the belly (1). */
  tones: readonly (readonly [number, string])[];
  marks: readonly Mark[];
  dorsal: FinPaint;
  anal: FinPaint;
  tail: FinPaint;
  pelvic: FinPaint;
  pectoral: FinPaint;
  iris: string;
  irisRim: string;
  lips: string;
  /** Strength of the dark hind edges of the scales and of their sparkle. */
  scaleEdge: number;
  sparkle: string;
  sparkleCover: number;
};

type Life = 'male' | 'female' | 'juvenile';
export type Drawn = {
  anatomy: Anatomy;
  adultMm: number;
  colours: Record<Life, Colouring>;
  egg: { mm: number; colour: string };
};
