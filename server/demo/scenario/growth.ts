import { between, type Chance, chanceOf, normal } from '../drawings/chance';
import type { StrainCode } from './strains';

/**
 * How the young of each strain grow here: von Bertalanffy with total lengths in mm, K per year, from the length at which
 * they swim free. Chosen for the story, near what keepers of these species see (common practice, no source).
 */
const CURVES: Record<StrainCode, { finalMm: number; perYear: number; freeMm: number; freeDay: number; cv: number }> = {
  MOIL: { finalMm: 125, perYear: 0.62, freeMm: 13, freeDay: 28, cv: 0.085 },
  LEMP: { finalMm: 105, perYear: 0.95, freeMm: 11, freeDay: 22, cv: 0.08 },
  MEUT: { finalMm: 140, perYear: 0.92, freeMm: 12, freeDay: 21, cv: 0.1 },
  ESMI: { finalMm: 112, perYear: 1.1, freeMm: 10, freeDay: 20, cv: 0.1 },
  CALI: { finalMm: 92, perYear: 1.1, freeMm: 10, freeDay: 20, cv: 0.09 },
  CATE: { finalMm: 122, perYear: 0.58, freeMm: 8, freeDay: 14, cv: 0.14 },
};

/** Mean total length in mm of a brood at an age in days; `vigour` is the brood's own share above or below the usual. */
export function meanLengthAt(strain: StrainCode, ageDays: number, vigour = 1): number {
  const { finalMm, perYear, freeMm, freeDay } = CURVES[strain];
  const left = 1 - freeMm / finalMm;
  return vigour * finalMm * (1 - left * Math.exp((-perYear * (ageDays - freeDay)) / 365));
}

/** Some broods grow a little better than others, and stay so. */
export const vigourOf = (brood: string): number => between(chanceOf(`${brood} vigour`), 0.95, 1.05);

/** Grams from total length in cm, by shape of the body: the usual figures for cichlids (assumed, see the species library). */
const WEIGHTS: Record<StrainCode, readonly [a: number, b: number]> = {
  MOIL: [0.018, 3],
  LEMP: [0.0075, 3.05],
  MEUT: [0.0075, 3.05],
  ESMI: [0.014, 3],
  CALI: [0.014, 3],
  CATE: [0.018, 3],
};

export type Sampled = { lengthTenthsMm: number; weightG: number | null };

/** Lengths of so many fish of a brood, as read off a ruler to half a millimetre. */
export function sampleOf(
  strain: StrainCode,
  brood: string,
  { ageDays, count, weighed }: { ageDays: number; count: number; weighed: boolean },
): Sampled[] {
  const chance = chanceOf(`${brood} sample ${ageDays}`);
  const mean = meanLengthAt(strain, ageDays, vigourOf(brood));
  const [a, b] = WEIGHTS[strain];
  return Array.from({ length: count }, () => {
    const mm = ruled(mean * (1 + CURVES[strain].cv * withinTwo(chance)));
    const grams = a * (mm / 10) ** b * between(chance, 0.92, 1.08);
    return { lengthTenthsMm: Math.round(mm * 10), weightG: weighed ? Math.round(grams * 100) / 100 : null };
  });
}

const ruled = (mm: number): number => Math.round(mm * 2) / 2;

/** A normal deviate without the far tails, which a keeper would measure twice. */
function withinTwo(chance: Chance): number {
  const deviate = normal(chance, 0, 1);
  return Math.abs(deviate) > 2.2 ? deviate / 3 : deviate;
}
