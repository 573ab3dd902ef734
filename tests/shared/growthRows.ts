import { expect } from 'vitest';
import * as z from 'zod/mini';
import type { LengthAtAge } from '@/shared/growth/ageGroups';
import type { GrowthModel } from '@/shared/growth/shapes';
import checks from './growthChecks.json';

/*
 * Published check values; each row names its source and how it was obtained. R stands for R 4.2.2's nls, lm and
 * survival. Left out of NIST's sets are those whose model is none of ours: Rat43 (four parameters), Misra1b, DanWood.
 */

const Row = z.object({
  id: z.string(),
  kind: z.string(),
  source: z.string(),
  inputs: z.unknown(),
  expected: z.unknown(),
});

/** The rows of a kind, read through the shapes of their inputs and expected values, named by id and source. */
export function rowsOf<I extends z.ZodMiniType, E extends z.ZodMiniType>(kind: string, inputs: I, expected: E) {
  const found = z
    .array(Row)
    .parse(checks)
    .filter((row) => row.kind === kind)
    .map((row) => ({
      id: row.id,
      source: row.source,
      inputs: inputs.parse(row.inputs),
      expected: expected.parse(row.expected),
    }));
  if (found.length === 0) throw new Error(`No rows of ${kind}`);
  return found;
}

export const Numbers = z.array(z.number());
export const Named = z.record(z.string(), z.number());

const MODELS: Record<string, GrowthModel> = { vbgf: 'vonBertalanffy', gompertz: 'gompertz', logistic: 'logistic' };

/** The rows' own names for the models: `vbgf`, `vbgf with t0 fixed at 0`. */
export function modelNamed(name: string): GrowthModel {
  const model = MODELS[name.split(' ')[0] ?? ''];
  if (!model) throw new Error(`No model ${name}`);
  return model;
}

export const lengthsAt = (ages: readonly number[], lengths: readonly number[]): LengthAtAge[] =>
  ages.map((ageDays, i) => ({ ageDays, lengthMm: lengths[i] ?? Number.NaN }));

/** Within a share of the wanted value. */
export function near(actual: number | null | undefined, wanted: number | undefined, relative: number): void {
  if (actual == null || wanted === undefined) throw new Error(`${actual} for ${wanted}`);
  expect(Math.abs(actual - wanted), `${actual} for ${wanted}`).toBeLessThanOrEqual(relative * Math.abs(wanted) + 1e-15);
}

/** Mulberry32 and Box-Muller: the same draws at every run. */
export function seeded(seed: number): { chance(): number; normal(): number } {
  let state = seed;
  const chance = () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return { chance, normal: () => Math.sqrt(-2 * Math.log(1 - chance())) * Math.cos(2 * Math.PI * chance()) };
}
