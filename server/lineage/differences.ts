import { allEquivalentGenerations } from '../../shared/lineage/completeness';
import type { LineageChange } from '../../shared/lineage/contract';
import { type GenerationRange, generationNumbers } from '../../shared/lineage/generations';
import { inbreeding } from '../../shared/lineage/inbreeding';
import type { Scope } from '../scope';
import { lineageNodes } from './nodes';

type Told = Pick<LineageChange, 'id' | 'thing' | 'code'> & { f: number; generation: GenerationRange; known: number };

/** What is said of every animal that follows from who its ancestors are. */
export async function figuresOf(scope: Scope): Promise<Told[]> {
  const nodes = await lineageNodes(scope);
  const entries = nodes.map((node) =>
    'from' in node ? { id: node.id, from: node.from } : { id: node.id, sire: node.sire, dam: node.dam },
  );
  const founders = new Map(
    nodes.flatMap(({ id, founderGeneration }) =>
      founderGeneration === null ? [] : [[id, founderGeneration] as const],
    ),
  );
  const f = inbreeding(entries);
  const generations = generationNumbers(entries, founders);
  const known = allEquivalentGenerations(entries);
  return nodes.map(({ id, thing, code }) => ({
    id,
    thing,
    code,
    f: f.get(id) ?? 0,
    generation: generations.get(id) ?? null,
    known: known.get(id) ?? 0,
  }));
}

const NEAR = 1e-9;

/** The animals whose figures differ, with both. */
export function differences(before: Told[], after: Told[]): LineageChange[] {
  const was = new Map(before.map((one) => [one.id, one]));
  return after.flatMap(({ id, thing, code, ...now }) => {
    const old = was.get(id);
    if (!old || isSame(old, now)) return [];
    const { f, generation, known } = old;
    return [{ id, thing, code, before: { f, generation, known }, after: now }];
  });
}

const isSame = (a: Omit<Told, 'id' | 'thing' | 'code'>, b: Omit<Told, 'id' | 'thing' | 'code'>): boolean =>
  Math.abs(a.f - b.f) < NEAR &&
  Math.abs(a.known - b.known) < NEAR &&
  a.generation?.low === b.generation?.low &&
  a.generation?.high === b.generation?.high;
