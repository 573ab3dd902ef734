import { useMemo, useState } from 'react';
import { useUrlWord } from '@/hooks/useUrlWord';
import type { Day } from '@/shared/days';
import { type Candidate, candidatesOf, usualGroup } from '@/shared/lineage/candidates';
import type { LineageNode } from '@/shared/lineage/contract';
import { type GroupFigures, groupFigures, type Proposal } from '@/shared/lineage/proposeGroups';
import type { SpeciesProfile } from '@/shared/species/profile';
import { useMatrix, useProposal } from './desk';

export const LIMITS = ['0.0625', '0.125', '0.25', '1'] as const;
type Limit = (typeof LIMITS)[number];

export type Group = { males: string[]; females: string[] };
type Given = { nodes: readonly LineageNode[]; of: readonly LineageNode[]; profile: SpeciesProfile | null; today: Day };

/** Limits live in the address, swaps on the page: figures follow at once, nothing is sent until the plan is saved. */
export function usePlan({ nodes, of, profile, today }: Given) {
  const limits = useLimits();
  const [out, setOut] = useState<ReadonlySet<string>>(new Set());
  const [taken, setTaken] = useState<ReadonlySet<string>>(new Set());
  const [swapped, setSwapped] = useState<Group[] | null>(null);
  const candidates = useMemo(() => candidatesOf(of, profile, today, limits.years), [of, profile, today, limits.years]);
  const isIn = ({ id, doubt }: Candidate) => !out.has(id) && (doubt === null || taken.has(id));
  const now = useMemo(() => colonyNow(of), [of]);
  const known = useMemo(() => new Set(candidates.map(({ id }) => id)), [candidates]);
  const isKnown = (id: string) => known.has(id);
  const matrix = useMatrix(nodes, [...candidates.map(({ id }) => id), ...now.males, ...now.females]);
  const side = (sex: 'male' | 'female') => candidates.filter((one) => one.sex === sex && isIn(one)).map(({ id }) => id);
  const [males, females] = [side('male'), side('female')];
  const usual = usualGroup(profile, { males: males.length, females: females.length });
  const counts = { males: limits.males ?? usual.males, females: limits.females ?? usual.females };
  const found = useProposal(nodes, { males, females, counts, limit: Number(limits.limit) });
  const proposal =
    tooFew(males.length, counts.males, 'males') ?? tooFew(females.length, counts.females, 'females') ?? found;
  const groups = swapped ?? groupsIn(proposal).filter((group) => [...group.males, ...group.females].every(isKnown));
  const change =
    <T>(then: (value: T) => void) =>
    (value: T) => {
      setSwapped(null);
      then(value);
    };
  return {
    ...limits,
    setLimit: change(limits.setLimit),
    setCount: (sex: 'males' | 'females', count: number) => change((n: number) => limits.setCount(sex, n))(count),
    setYears: change(limits.setYears),
    counts,
    candidates,
    isIn,
    toggle: change((one: Candidate) => {
      if (one.doubt) setTaken(flipped(taken, one.id));
      else setOut(flipped(out, one.id));
    }),
    proposal,
    groups,
    swappedByHand: swapped !== null,
    swap: (from: string, to: string) =>
      setSwapped(groups.map(({ males: m, females: f }) => ({ males: put(m, from, to), females: put(f, from, to) }))),
    reset: () => setSwapped(null),
    figures: groups.map((group) => (matrix ? groupFigures(matrix, group.males, group.females) : null)),
    now: { ...now, figures: matrix ? groupFigures(matrix, now.males, now.females) : null },
  };
}

export type Plan = ReturnType<typeof usePlan>;
export type { GroupFigures };

const groupsIn = (proposal: Proposal | null): Group[] =>
  proposal && 'groups' in proposal ? proposal.groups.map(({ males, females }) => ({ males, females })) : [];

const tooFew = (there: number, wanted: number, word: string): Proposal | null =>
  there < wanted
    ? { fits: 'none', because: `${wanted} ${word} are wanted and ${there} can be chosen`, atLimit: null }
    : null;

const put = (ids: string[], from: string, to: string): string[] => ids.map((id) => (id === from ? to : id));

function flipped(set: ReadonlySet<string>, id: string): ReadonlySet<string> {
  const next = new Set(set);
  if (!next.delete(id)) next.add(id);
  return next;
}

function useLimits() {
  const [limit, setLimit] = useUrlWord<Limit>('limit', '0.125', LIMITS);
  const [males, setMales] = useUrlWord<string>('males', '');
  const [females, setFemales] = useUrlWord<string>('females', '');
  const [years, setYears] = useUrlWord<string>('years', '');
  const count = (word: string): number | null => (/^[1-9]\d?$/.test(word) ? Number(word) : null);
  return {
    limit,
    setLimit,
    males: count(males),
    females: count(females),
    years: count(years),
    setCount: (sex: 'males' | 'females', to: number) =>
      (sex === 'males' ? setMales : setFemales)(String(Math.max(1, to))),
    setYears: (to: number | null) => setYears(to === null ? '' : String(to)),
  };
}

/** What the keeper has now: the colony with most of these fish. */
function colonyNow(of: readonly LineageNode[]): Group & { code: string | null } {
  const living = of.filter(({ thing, living: here, colony }) => thing === 'fish' && here && colony);
  const sizes = new Map<string, number>();
  for (const { colony } of living) if (colony) sizes.set(colony.code, (sizes.get(colony.code) ?? 0) + 1);
  const code = [...sizes].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null;
  const members = living.filter(({ colony }) => colony?.code === code);
  const ids = (sex: string) => members.filter((one) => one.sex === sex).map(({ id }) => id);
  return { code, males: ids('male'), females: ids('female') };
}
