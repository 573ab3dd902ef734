import * as z from 'zod/mini';
import { type ListingDraft, type Offer, PriceClass } from '@/shared/buyers/offers';
import { Id } from '@/shared/ids';
import { spelledMoney } from '@/shared/money';
import { Heads, TypedNote } from '@/shared/shapes';
import { orBlank, spelledHeads, spelledLength } from '@/shared/spelled';
import type { UnitChoices } from '@/shared/units';

/** What the owner types of a brood: prices as text, lots by name. */
export const listingDraft = (currency: string, units: UnitChoices) =>
  z.strictObject({
    listed: z.boolean(),
    classes: z.array(z.strictObject({ key: Id, fromTenthsMm: spelledLength(units), cents: spelledMoney(currency) })),
    pair: orBlank(spelledMoney(currency)),
    trio: orBlank(spelledMoney(currency)),
    group: orBlank(spelledMoney(currency)),
    groupHeads: orBlank(spelledHeads(Heads)),
    note: TypedNote,
    photoId: z.nullable(Id),
  });

type Draft = ReturnType<typeof listingDraft>;

/** What is said of a brood now, as typed. */
export function startOf(schema: Draft, { listing }: Offer, newKey: () => string): z.input<Draft> {
  const lotOf = (name: 'pair' | 'trio' | 'group') => listing?.prices?.lots.find(({ lot }) => lot === name);
  const classes = listing?.prices?.classes ?? [];
  return z.encode(schema, {
    listed: listing?.listed ?? false,
    classes: classes.map((one) => ({ key: newKey(), ...PriceClass.parse(one) })),
    pair: centsOf(lotOf('pair')),
    trio: centsOf(lotOf('trio')),
    group: centsOf(lotOf('group')),
    groupHeads: lotOf('group')?.heads ?? null,
    note: listing?.note ?? null,
    photoId: listing?.photoId ?? null,
  });
}

const centsOf = (lot: { cents: number } | undefined) => (lot ? PriceClass.shape.cents.parse(lot.cents) : null);

const USUAL_GROUP = 6;

/** What is sent of it. */
export function saidIn(draft: z.output<Draft>, version: number | null): z.input<typeof ListingDraft> {
  const { listed, classes, pair, trio, group, groupHeads, note, photoId } = draft;
  return {
    version,
    listed,
    note,
    photoId,
    classes: classes.map(({ fromTenthsMm, cents }) => ({ fromTenthsMm, cents })),
    lots: [
      ...(pair === null ? [] : [{ lot: 'pair' as const, heads: 2, cents: pair }]),
      ...(trio === null ? [] : [{ lot: 'trio' as const, heads: 3, cents: trio }]),
      ...(group === null ? [] : [{ lot: 'group' as const, heads: groupHeads ?? USUAL_GROUP, cents: group }]),
    ],
  };
}
