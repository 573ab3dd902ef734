import type { DrawnSpecies } from './species';

type Shot = {
  species: DrawnSpecies;
  lengthMm: number;
  /** Tells this picture from others of the same fish: light, backdrop, small turns of the body. */
  shot: string;
  size: { w: number; h: number };
  /** How many millimetres the picture is wide where it carries a ruler; chosen from the length when left out. */
  spanMm?: number;
};

export type FishDescription = Shot & {
  setting: 'box' | 'tank';
  life: 'male' | 'female' | 'juvenile' | 'fry' | 'yolk-fry';
  /** Tells this fish from others of its species: its markings stay with it. */
  individual: string;
  /** A mouth full of eggs or fry. */
  holding?: boolean;
  pose: 'left' | 'right' | 'three-quarter';
  /** Others of the species further back; in a tank only. */
  companions?: number;
};

/** Eggs, wrigglers or fry from above, in a tray with a ruler along its edge. */
export type TrayDescription = Shot & { setting: 'tray'; life: 'eggs' | 'yolk-fry' | 'fry'; count: number };

export type Description = FishDescription | TrayDescription;

/** Parts of a picture as SVG, from the back to the front. */
export type Drawing = {
  size: { w: number; h: number };
  /** Out of focus. */
  backdrop: string;
  /** In focus: the fish alone. */
  subject: string;
  /** In focus, before the fish: ruler and glass. */
  front: string;
  pxPerMm: number;
  /** Where the ruler's zero stands, when the picture has one. */
  ruler: { zeroX: number; topY: number } | null;
};

/** Widths in millimetres that a keeper would frame: the fish fills about two thirds. */
const SPANS = [16, 24, 32, 48, 64, 80, 100, 120, 150, 180, 220, 260, 320];

export function spanFor(lengthMm: number, share: number): number {
  return SPANS.find((span) => lengthMm <= span * share) ?? lengthMm / share;
}
