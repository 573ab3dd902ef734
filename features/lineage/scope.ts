import { useUrlWord } from '@/hooks/useUrlWord';
import type { LineageNode } from '@/shared/lineage/contract';
import { relativesWithin } from '@/shared/lineage/relatives';
import { entryOf, type Nodes } from './entries';

/** What the Lineage place is about: a strain, or one colony of it. */
export type Scope = { value: string; word: string; code: string; note?: string };

export function scopesOf(nodes: Nodes): Scope[] {
  const strains = new Map<string, { code: string; name: string; living: number }>();
  const colonies = new Map<string, string>();
  for (const { strainId, strainCode, displayName, living, colony } of nodes) {
    if (strainId && strainCode) {
      const known = strains.get(strainId);
      strains.set(strainId, {
        code: strainCode,
        name: displayName ?? '',
        living: (known?.living ?? 0) + Number(living),
      });
    }
    if (colony) colonies.set(colony.id, colony.code);
  }
  return [
    ...[...strains]
      .sort((a, b) => b[1].living - a[1].living)
      .map(([id, { code, name }]) => ({ value: `strain:${id}`, code, word: name, note: 'Strain' })),
    ...[...colonies].map(([id, code]) => ({ value: `colony:${id}`, code, word: 'Colony', note: 'Colony' })),
  ];
}

/** Kept in the address; the strain with most living fish to begin with. */
export function useScope(nodes: Nodes): { scopes: Scope[]; scope: Scope | null; setScope: (value: string) => void } {
  const scopes = scopesOf(nodes);
  const [word, setScope] = useUrlWord<string>('of', '');
  const [colony] = useUrlWord<string>('colony', '');
  const asked = word || (colony ? `colony:${colony}` : '');
  return { scopes, scope: scopes.find(({ value }) => value === asked) ?? scopes[0] ?? null, setScope };
}

/** The animals of a scope: of a colony its fish and their broods. */
export function inScope(nodes: Nodes, scope: Scope): LineageNode[] {
  const [kind, id] = scope.value.split(':');
  if (kind === 'strain') return nodes.filter(({ strainId }) => strainId === id);
  return nodes.filter(({ colony }) => colony?.id === id);
}

const ANCESTORS = 3;

/** The animals with their possible ancestors over three generations, for drawing; each once, in the pedigree's order. */
export function withAncestors(nodes: Nodes, chosen: readonly LineageNode[]): LineageNode[] {
  const entries = nodes.map(entryOf);
  const shown = new Set<string>();
  for (const { id } of chosen) {
    if (shown.has(id)) continue;
    for (const entry of relativesWithin(entries, id, { ancestors: ANCESTORS, descendants: 0 }).entries)
      shown.add(entry.id);
  }
  return nodes.filter(({ id }) => shown.has(id));
}
