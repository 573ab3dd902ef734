import { finite } from '../badValue';
import type { SampleStats } from './sampleStats';

/**
 * Fish to measure before their unevenness means anything, and where it asks for grading. Common practice, no source.
 */
const FISH_FOR_GRADING = 8;
const UNEVEN_FROM = 0.15;
const GRADE_FROM = 0.2;
/** A fish twice as long as its brood mate takes its food and nips it, whatever the rest look like. */
const TWICE = 2;

/**
 * What a sample says about sorting a batch by size. `reason` says why to grade: the CV, or one fish twice another's
 * length.
 */
export type GradingAdvice =
  | { advice: 'measureMore'; missing: number }
  | { advice: 'leave' | 'watch'; cv: number }
  | { advice: 'grade'; cv: number; reason: 'cv' | 'twiceAsLong' };

/**
 * When to grade: CV of length (a fraction) of 0.20 or more, or the longest fish twice the shortest; from 0.15, watch.
 * Needs eight fish. The limits are common practice, no source; CV of weight would be about three times as large.
 */
export function gradingAdvice({ n, cv, min, max }: Pick<SampleStats, 'n' | 'cv' | 'min' | 'max'>): GradingAdvice {
  if (cv === null || n < FISH_FOR_GRADING) return { advice: 'measureMore', missing: Math.max(1, FISH_FOR_GRADING - n) };
  finite('CV', cv, { min: 0 });
  if (cv >= GRADE_FROM) return { advice: 'grade', cv, reason: 'cv' };
  if (max >= TWICE * finite('Shortest fish', min, { above: 0 })) return { advice: 'grade', cv, reason: 'twiceAsLong' };
  return { advice: cv >= UNEVEN_FROM ? 'watch' : 'leave', cv };
}
