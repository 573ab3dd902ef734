import { BadValue, finite } from '../badValue';

/** kg per litre: water at 20 °C, and float glass (EN 572-1). */
const WATER = 0.9982;
const GLASS = 2.5;
const GRAVITY = 9.80665;
const MM3_PER_LITRE = 1e6;

export const FLOOR_CAUTION =
  'This is arithmetic, not a judgement of your floor. Before you set up a large tank or a rack, have the structure checked by someone qualified, and follow local rules.';

/** A glass tank: outer sides, depth of the water above the bottom pane, thickness of the panes; stand and decor in kg. */
export type TankBuild = {
  lengthMm: number;
  widthMm: number;
  heightMm: number;
  fillMm: number;
  glassMm: number;
  standKg?: number;
  decorKg?: number;
};

export type FloorLoad = {
  totalKg: number;
  kgPerM2: number;
  waterLitres: number;
  waterKg: number;
  glassKg: number;
  kilopascals: number;
};

/**
 * Weight of a filled tank and its load on the floor under it: water (998.2 kg/m³ at 20 °C) in the inner box to the water
 * line, glass (2500 kg/m³) as outer less inner box, open at the top with panes of one thickness, and what stands in and
 * under it, over the outer footprint. Geometry; it says nothing of what the floor can bear (`FLOOR_CAUTION`).
 * Throws `BadValue` for sides that cannot be, or water above the rim.
 */
export function floorLoad(tank: TankBuild): FloorLoad {
  const length = finite('Length', tank.lengthMm, { above: 0, max: 20_000 });
  const width = finite('Width', tank.widthMm, { above: 0, max: 20_000 });
  const height = finite('Height', tank.heightMm, { above: 0, max: 20_000 });
  const glass = finite('Glass', tank.glassMm, { min: 0 });
  const extra = finite('Stand', tank.standKg ?? 0, { min: 0 }) + finite('Decor', tank.decorKg ?? 0, { min: 0 });
  const inner = { length: length - 2 * glass, width: width - 2 * glass, height: height - glass };
  if (Math.min(inner.length, inner.width, inner.height) <= 0)
    throw new BadValue('Glass', glass, 'leaves no room inside');
  const fill = finite('Depth of the water', tank.fillMm, { min: 0, max: inner.height });
  const base = inner.length * inner.width;
  const waterLitres = (base * fill) / MM3_PER_LITRE;
  const glassLitres = (length * width * height - base * inner.height) / MM3_PER_LITRE;
  const waterKg = waterLitres * WATER;
  const glassKg = glassLitres * GLASS;
  const totalKg = waterKg + glassKg + extra;
  const kgPerM2 = totalKg / ((length * width) / MM3_PER_LITRE);
  return { totalKg, kgPerM2, waterLitres, waterKg, glassKg, kilopascals: (kgPerM2 * GRAVITY) / 1000 };
}
