import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { KeyValues } from '@/components/ui/KeyValues';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { VirtualList } from '@/components/ui/VirtualList';
import { formatDate } from '@/shared/days';
import type { ImportPreview } from '@/shared/sheets/importContract';
import { ancestorsWords, FATE_WORDS } from '@/shared/sheets/importWords';
import { completenessWords, generationWords } from '@/shared/sheets/sayings';
import { claimWords } from './claimWords';

/** Who the fish are, who says so, and which ancestors come along. */
export function ImportFacts({ preview }: { preview: ImportPreview }) {
  const { content, animals } = preview;
  const { fishroom, issue, inbreeding, generation } = content;
  return (
    <View style={{ gap: space[4] }}>
      <FiguresStrip
        figures={[
          { figure: String(preview.heads), label: 'fish' },
          { figure: generation ? generationWords({ ...generation, oneParentWild: false }) : 'F?', label: 'generation' },
          { figure: inbreeding ? (inbreeding.f === 0 ? '0' : inbreeding.f.toFixed(3)) : '–', label: 'expected F' },
        ]}
      />
      <KeyValues
        pairs={[
          { key: 'Fish', value: content.subject.code },
          { key: 'Strain', value: claimWords(content.strain) },
          {
            key: 'Fishroom',
            value: [fishroom.name, fishroom.place].filter(Boolean).join(', '),
            note: fishroom.address.replace(/^https?:\/\//, ''),
          },
          { key: 'Pedigree known', value: completenessWords(inbreeding) },
          { key: 'Issued', value: `${formatDate(issue.on)}, ${issue.by}` },
        ]}
      />
      <Section title="Ancestors" aside={animals.length > 0 ? String(animals.length) : undefined}>
        <Text size="small" tone="soft" style={{ marginBottom: space[2] }}>
          {ancestorsWords(animals)}
        </Text>
        {animals.length > 0 ? (
          <Rows label="Ancestors">
            <VirtualList items={animals} keyOf={({ id }) => id}>
              {({ code, sex, generation: number, room, fate }) => (
                <Row
                  margin={<SexShape sex={sex === 'unsexed' ? 'unknown' : sex} />}
                  title={<Code>{code}</Code>}
                  state={FATE_WORDS[fate]}
                  note={[number, room].filter(Boolean).join(' · ') || 'generation not known'}
                />
              )}
            </VirtualList>
          </Rows>
        ) : null}
      </Section>
    </View>
  );
}
