import { PickField } from '@/components/form/PickGrid';
import { Part } from '@/features/entries/Part';
import { CANNOT_TELL } from './beginning';
import { shortCodes } from './shortCode';
import type { Sire } from './sireDraft';

/** Of a spawn that was watched: which male. */
export function WhichSire({ sires }: { sires: readonly Sire[] }) {
  const coded = sires.filter(({ code }) => code !== null);
  const short = shortCodes(coded.flatMap(({ code }) => code ?? []));
  return (
    <Part title="Which male?">
      <PickField
        name="sireId"
        label="Which male?"
        picks={[
          ...coded.map(({ fishId, code, sex, dominantDays }) => ({
            value: fishId,
            code: short(code ?? ''),
            sex,
            ...(dominantDays > 0 ? { note: 'dominant' } : {}),
          })),
          { value: CANNOT_TELL, word: 'Several, or can’t tell' },
        ]}
      />
    </Part>
  );
}
