import * as z from 'zod/mini';
import { Email } from '@/shared/accounts/shapes';
import type { AskDraft } from '@/shared/buyers/ask';
import { Heads, line, TypedNote } from '@/shared/shapes';
import { orBlank, spelledHeads, spelledLength } from '@/shared/spelled';
import { METRIC } from '@/shared/units';

const person = { name: line(80, 'Type your name'), email: Email, words: TypedNote };

/** What a visitor types: lengths in centimetres, like the page. */
export const FishAsk = z.strictObject({
  heads: spelledHeads(Heads),
  lengthTenthsMm: orBlank(spelledLength(METRIC)),
  ...person,
});
export const NoticeAsk = z.strictObject({
  heads: orBlank(spelledHeads(Heads)),
  lengthTenthsMm: spelledLength(METRIC),
  ...person,
});

const NOTHING = { lengthTenthsMm: '', name: '', email: '', words: '' };
export const FISH_START = { ...NOTHING, heads: '' };
export const NOTICE_START = { ...NOTHING, heads: '' };

/** The names of its fields as the form has them: refusals land beside what was typed. */
export const fieldsHere = (fields: Record<string, string>): Record<string, string> =>
  Object.fromEntries(Object.entries(fields).map(([field, words]) => [field.replace('asks.', ''), words]));

type Typed<K> = Extract<AskDraft['asks'], { kind: K }>;

export const fishAsked = (
  broodId: Typed<'fish'>['broodId'],
  draft: z.output<typeof FishAsk>,
): z.input<typeof AskDraft> => {
  const { heads, lengthTenthsMm, ...who } = draft;
  return { asks: { kind: 'fish', broodId, heads, lengthTenthsMm }, ...who };
};

export const noticeAsked = (
  strainId: Typed<'notice'>['strainId'],
  draft: z.output<typeof NoticeAsk>,
): z.input<typeof AskDraft> => {
  const { heads, lengthTenthsMm, ...who } = draft;
  return { asks: { kind: 'notice', strainId, heads, lengthTenthsMm }, ...who };
};
