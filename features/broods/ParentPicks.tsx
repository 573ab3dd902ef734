import { useField } from 'formik';
import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { Code } from '@/components/ui/Code';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { FishRow } from '@/shared/fish/contract';

type Props = { name: string; label: string; fish: readonly FishRow[] };

/** Who may be a parent: none ticked says that nothing is known of that side. */
export function ParentPicks({ name, label, fish }: Props) {
  const [{ value }, , { setValue }] = useField<string[]>(name);
  const coded = fish.filter(({ code }) => code !== null);
  if (coded.length === 0)
    return <Text size="small" tone="soft">{`${label}: none with a code is in this tank, so nothing is claimed.`}</Text>;
  return (
    <View role="group" aria-label={label}>
      <Text size="small" semi>
        {label}
      </Text>
      {coded.map(({ id, code, sex }) => (
        <CheckRow
          key={id}
          on={value.includes(id)}
          onChange={(on) => void setValue(on ? [...value, id] : value.filter((one) => one !== id))}
          label={`${code}, ${sex === 'unknown' ? 'not sexed' : sex}`}
        >
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: 8 }}>
            <SexShape sex={sex} />
            <Code>{code ?? ''}</Code>
          </View>
        </CheckRow>
      ))}
    </View>
  );
}
