import * as z from 'zod/mini';
import { fieldsOf } from '@/shared/fieldsOf';
import { previewParentage } from '@/shared/lineage/contract';
import type { Fields } from '@/shared/refusal';
import type { ParentageRead, SireThen } from './queries';

/** A possible parent and its share as typed, in percent; `fishId` null: one not known. */
const Line = z.strictObject({ fishId: z.nullable(z.string()), share: z.string() });
export type ParentLine = z.output<typeof Line>;

/** What stands on the page, as it was typed. */
const Draft = z.strictObject({
  sires: z.array(Line),
  dams: z.array(Line),
  paternity: z.enum(['single', 'mixed']),
  basis: z.string(),
});
export type ParentsDraft = z.output<typeof Draft>;

export const isDraft = (value: unknown): value is ParentsDraft => Draft.safeParse(value).success;

const linesOf = (parents: ParentageRead['parentage']['sires']): ParentLine[] =>
  parents.map(({ fishId, share }) => ({ fishId, share: percent(share) }));

const percent = (share: number): string => String(Math.round(share * 1000) / 10);

export const draftOf = ({ parentage }: ParentageRead): ParentsDraft => ({
  sires: linesOf(parentage.sires),
  dams: linesOf(parentage.dams),
  paternity: parentage.paternity,
  basis: parentage.basis ?? '',
});

/** Shares need not sum to 100. A comma is a decimal point too; one parent alone is certain whatever its share says. */
const fractionsOf = (lines: readonly ParentLine[]) =>
  lines.map(({ fishId, share }) => ({ fishId, weight: lines.length === 1 ? 1 : typed(share) / 100 }));

const typed = (share: string): number => (share.trim() === '' ? Number.NaN : Number(share.replace(',', '.')));

/** The body to send, or what is wrong with it by its fields. */
export function bodyOf({ sires, dams, paternity, basis }: ParentsDraft, turn: number) {
  const parentage = { paternity, basis: basis.trim() || null, sires: fractionsOf(sires), dams: fractionsOf(dams) };
  const read = previewParentage.body.safeParse({ turn, parentage });
  return read.success ? { body: { turn, parentage }, wrong: {} } : { body: null, wrong: fieldsOf(read.error) };
}

/** The messages at one side's lines: by share or by fish, whichever is wrong. */
export const wrongAt = (wrong: Fields, side: 'sires' | 'dams', at: number): string | null =>
  wrong[`parentage.${side}.${at}.weight`] ?? wrong[`parentage.${side}.${at}.fishId`] ?? null;

/** The males that were there, by the days each was dominant, and those days in words. */
export function byDominance(there: readonly SireThen[]): Pick<ParentsDraft, 'sires' | 'basis'> {
  const seen = there.filter(({ dominantDays }) => dominantDays > 0);
  return {
    sires: there.map(({ fishId, share }) => ({ fishId, share: percent(share) })),
    basis:
      seen.length === 0
        ? 'Equal shares: no dominance recorded'
        : seen
            .map(({ code, dominantDays, ofDays }) => `${code ?? 'a male'} dominant ${dominantDays} of ${ofDays} days`)
            .join(', '),
  };
}

/** What the record says of a male at the time: "Dominant 12 of 15 days"; null where nobody asked or it is no male of ours. */
export function thenOf(fishId: string | null, there: readonly SireThen[] | undefined, tank: string): string | null {
  if (!there || fishId === null) return null;
  const male = there.find((one) => one.fishId === fishId);
  if (!male) return `Not in ${tank} at the time`;
  return male.dominantDays > 0
    ? `Dominant ${male.dominantDays} of ${male.ofDays} days`
    : `In ${tank}, never seen dominant`;
}
