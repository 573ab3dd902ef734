import * as z from 'zod/mini';
import type { proposeSires } from '@/shared/holds/contract';

export type Sire = z.output<typeof proposeSires.output>['sires'][number];

/** The key of "a male not known" among the shares. */
export const NOT_KNOWN = 'notKnown';

/** What the keeper changed of the proposal: who is left out, shares typed in percent, and whether a stranger may be the father. */
export const SireDraft = z.strictObject({
  off: z.array(z.string()),
  shares: z.record(z.string(), z.optional(z.string())),
  notKnown: z.boolean(),
});
export type SireDraft = z.output<typeof SireDraft>;
export const NO_CHANGE: SireDraft = { off: [], shares: {}, notKnown: false };

/** What a male not known weighs until something is typed, as a share of all. */
const NOT_KNOWN_SHARE = 0.1;

export type SireLine = { key: string; fishId: string | null; sire: Sire | null; on: boolean; share: number };

/** Every possible sire with the share it has now; the shares of those that are in add up to 1. */
export function sireLines(sires: readonly Sire[], { off, shares, notKnown }: SireDraft): SireLine[] {
  const typed = (key: string) => {
    const percent = Number((shares[key] ?? '').replace(',', '.'));
    return shares[key]?.trim() && percent >= 0 ? percent / 100 : null;
  };
  const lines = [
    ...sires.map((sire) => ({
      key: sire.fishId,
      fishId: sire.fishId,
      sire,
      on: !off.includes(sire.fishId),
      weight: typed(sire.fishId) ?? sire.share,
    })),
    { key: NOT_KNOWN, fishId: null, sire: null, on: notKnown, weight: typed(NOT_KNOWN) ?? NOT_KNOWN_SHARE },
  ];
  const sum = lines.reduce((total, { on, weight }) => total + (on ? weight : 0), 0);
  return lines.map(({ weight, ...line }) => ({ ...line, share: line.on && sum > 0 ? weight / sum : 0 }));
}

/** The candidates of a parentage: those in, with a share above zero. */
export const candidatesOf = (lines: readonly SireLine[]) =>
  lines.filter(({ on, share }) => on && share > 0).map(({ fishId, share }) => ({ fishId, weight: share }));

/** What the shares rest on, as the hold's page tells it later. */
export function basisOf(lines: readonly SireLine[], { shares }: SireDraft): string | null {
  if (Object.values(shares).some((text) => text?.trim())) return 'Shares set by hand';
  const inNow = lines.filter(({ on }) => on);
  if (inNow.some(({ sire }) => sire?.ofDays === 0)) return 'Equal shares: recorded without a signal';
  const dominant = lines.flatMap(({ on, sire }) => (on && sire && sire.dominantDays > 0 ? [sire] : []));
  if (dominant.length === 0) return inNow.length > 1 ? 'Equal shares: no dominance recorded' : null;
  return dominant
    .map(({ code, dominantDays, ofDays }) => `${code ?? 'a male'} dominant ${dominantDays} of ${ofDays} days`)
    .join(', ');
}
