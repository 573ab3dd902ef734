import { useGlobalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { useUrlWord } from '@/hooks/useUrlWord';
import type { LineageNode } from '@/shared/lineage/contract';
import { withAncestorIds } from '@/shared/lineage/descendants';
import { entriesOf, type Nodes } from './entries';

/** What the Lineage place is about: a strain, one colony of it, or any fish. */
export type Scope = {
  value: string;
  word: string;
  code?: string;
  note?: string;
  /** In a sentence: "DUMA", "the chosen fish". */
  said: string;
  /** The fish chosen one by one. */
  ids?: readonly string[];
};

export const CHOSEN = 'fish';

export function scopesOf(nodes: Nodes, chosen: readonly string[] = []): Scope[] {
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
      .map(([id, { code, name }]) => ({ value: `strain:${id}`, code, word: name, note: 'Strain', said: code })),
    ...[...colonies].map(([id, code]) => ({ value: `colony:${id}`, code, word: 'Colony', note: 'Colony', said: code })),
    { value: CHOSEN, word: 'Fish that you choose', note: 'Any of them', said: 'the chosen fish', ids: chosen },
  ];
}

type InScope = {
  scopes: Scope[];
  scope: Scope | null;
  setScope: (value: string) => void;
  setChosen: (ids: readonly string[]) => void;
};

/** Kept in the address; the strain with most living fish to begin with. */
export function useScope(nodes: Nodes): InScope {
  const [word, setScope] = useUrlWord<string>('of', '');
  const [colony] = useUrlWord<string>('colony', '');
  const [chosen, setChosen] = useUrlWord<string>('chosen', '');
  const scopes = useMemo(() => {
    const ids = new Set(chosen.split(','));
    const known = nodes.flatMap(({ id }) => (ids.has(id) ? [id] : []));
    return scopesOf(nodes, known);
  }, [nodes, chosen]);
  const asked = word || (colony ? `colony:${colony}` : '');
  return {
    scopes,
    scope: scopes.find(({ value }) => value === asked) ?? scopes[0] ?? null,
    setScope,
    setChosen: (next) => setChosen(next.join(',')),
  };
}

/** The part of the address that says what the place is about, to go on to its other pages with. */
export function useScopeQuery(): string {
  const params = useGlobalSearchParams();
  const kept = (['of', 'colony', 'chosen'] as const).flatMap((key) => {
    const word = params[key];
    return typeof word === 'string' && word !== '' ? [`${key}=${encodeURIComponent(word)}`] : [];
  });
  return kept.join('&');
}

/** The animals of a scope: of a colony its fish. */
export function inScope(nodes: Nodes, scope: Scope): LineageNode[] {
  if (scope.ids) {
    const chosen = new Set(scope.ids);
    return nodes.filter((node) => chosen.has(node.id));
  }
  const [kind, id] = scope.value.split(':');
  if (kind === 'strain') return nodes.filter(({ strainId }) => strainId === id);
  return nodes.filter(({ colony }) => colony?.id === id);
}

const ANCESTORS = 3;

/** The animals with their possible ancestors over three generations, for drawing; each once, in the pedigree's order. */
export function withAncestors(nodes: Nodes, chosen: readonly LineageNode[]): LineageNode[] {
  const ids = chosen.map(({ id }) => id);
  const shown = withAncestorIds(entriesOf(nodes), ids, ANCESTORS);
  return nodes.filter(({ id }) => shown.has(id));
}
