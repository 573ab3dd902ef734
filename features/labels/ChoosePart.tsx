import { View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { Code } from '@/components/ui/Code';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { VirtualList } from '@/components/ui/VirtualList';

type Props = {
  title: string;
  rows: { id: string; code: string; note: string }[];
  chosen: ReadonlySet<string>;
  onChange: (chosen: ReadonlySet<string>) => void;
};

/** Things to tick, one by one or all. */
export function ChoosePart({ title, rows, chosen, onChange }: Props) {
  if (rows.length === 0) return null;
  const all = rows.every(({ id }) => chosen.has(id));
  const toggleAll = () => {
    const next = new Set(chosen);
    for (const { id } of rows)
      if (all) next.delete(id);
      else next.add(id);
    onChange(next);
  };
  const toggle = (id: string) => {
    const next = new Set(chosen);
    if (!next.delete(id)) next.add(id);
    onChange(next);
  };
  const word = title.toLowerCase();
  return (
    <Section
      title={title}
      aside={
        <TextLink label={all ? 'None' : 'All'} describe={all ? `No ${word}` : `All ${word}`} onPress={toggleAll} />
      }
    >
      <View role="group" aria-label={title}>
        <VirtualList items={rows} keyOf={({ id }) => id} estimate={56}>
          {({ id, code, note }) => (
            <CheckRow
              on={chosen.has(id)}
              onChange={() => toggle(id)}
              label={note ? `${code}, ${note}` : code}
              note={
                <Text size="small" tone="soft">
                  {note}
                </Text>
              }
            >
              <Code>{code}</Code>
            </CheckRow>
          )}
        </VirtualList>
      </View>
    </Section>
  );
}
