import { useField } from 'formik';
import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { NumberField } from '@/components/form/NumberField';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { SexShape } from '@/components/ui/SexShape';
import { Part } from '@/features/entries/Part';
import type { FishRow } from '@/shared/fish/contract';
import type { Resident } from '@/shared/tanks/contract';

type Props = { batches: readonly (Resident & { tank: string })[]; fish: readonly FishRow[] };

/** What died of it: heads of each batch, and single fish by their codes. */
export function IncidentLosses({ batches, fish }: Props) {
  const [{ value: died }, , { setValue }] = useField<string[]>('fishDied');
  const coded = fish.filter(({ code }) => code !== null);
  if (batches.length + coded.length === 0) return null;
  return (
    <Part title="What died of it?" aside="leave empty what is well">
      <View style={{ gap: space[3] }}>
        {batches.map(({ id, code, heads, tank }) => (
          <NumberField key={id} name={`losses.${id}`} label={`${code} in ${tank}`} unit={`of ${heads}`} whole />
        ))}
      </View>
      {coded.map(({ id, code, sex, tank }) => {
        const on = died.includes(id);
        return (
          <CheckRow
            key={id}
            on={on}
            onChange={() => void setValue(on ? died.filter((other) => other !== id) : [...died, id])}
            label={`${code} died`}
            note={tank?.code}
          >
            <SexShape sex={sex} />
            <Code>{code ?? ''}</Code>
          </CheckRow>
        );
      })}
    </Part>
  );
}
