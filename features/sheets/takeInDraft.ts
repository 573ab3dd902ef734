import * as z from 'zod/mini';
import { DayText } from '@/shared/days';
import { KEPT_AS } from '@/shared/fish/contract';
import { HeadsOrNone, TypedDay, typedLine } from '@/shared/shapes';
import type { ImportDraft, ImportPreview, SheetSource } from '@/shared/sheets/importContract';
import { spelledHeads } from '@/shared/spelled';
import type { StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';

/** In place of a strain's id: one is made out of the sheet. */
export const NEW_STRAIN = 'new';

export const TakeInDraft = z.strictObject({
  heads: spelledHeads(HeadsOrNone),
  strainId: z.optional(z.string()),
  newStrain: z.strictObject({ code: z.optional(z.string()) }),
  code: typedLine(24),
  keptAs: z.enum(KEPT_AS),
  receivedOn: DayText,
  tankId: z.optional(z.string()),
  quarantineUntil: TypedDay,
  unchecked: z.boolean(),
});
type Value = z.output<typeof TakeInDraft>;

/** Whether fish of it are still to come in: of a replaced sheet, or the same again, there may be none. */
export const headsLeft = ({ heads, taken, before, content }: ImportPreview): number =>
  content.subject.kind === 'fish' && before.some((one) => one.heads > 0) ? 0 : heads - taken;

export function startOf(
  preview: ImportPreview,
  { tanks, today, until }: { strains: StrainRow[]; tanks: TankRow[]; today: string; until: string },
) {
  const [fits] = preview.strains;
  return {
    heads: String(preview.content.issue.replaces && preview.before.length > 0 ? 0 : headsLeft(preview)),
    strainId: fits ?? (preview.newStrain ? NEW_STRAIN : ''),
    newStrain: { code: preview.newStrain?.code ?? '' },
    code: preview.code ?? '',
    keptAs: 'breeder' as const,
    receivedOn: today,
    tankId: tanks.find(({ purpose }) => purpose === 'quarantine')?.id ?? '',
    quarantineUntil: until,
    unchecked: false,
  };
}

export function draftOf(
  value: Value,
  { source, preview, newId }: { source: SheetSource; preview: ImportPreview; newId: string },
): ImportDraft {
  const { newStrain, strainId, tankId, code, ...rest } = value;
  const some = value.heads > 0;
  return {
    ...rest,
    source,
    taken: preview.taken,
    strainId: some && strainId && strainId !== NEW_STRAIN ? strainId : null,
    newStrain: some && strainId === NEW_STRAIN ? { id: newId, code: newStrain.code ?? '' } : null,
    code: some && preview.content.subject.kind === 'fish' ? code : null,
    tankId: some ? tankId || null : null,
  };
}
