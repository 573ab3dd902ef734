import { StyleSheet, View } from 'react-native';
import { InputBox } from '@/components/form/InputBox';
import { type Option, Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { IconButton } from '@/components/ui/IconButton';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { type Nodes, nameOf } from './entries';

/** A possible parent and its share as typed, in percent; `fishId` null: one not known. */
export type ParentLine = { fishId: string | null; share: string };

const NOT_KNOWN = 'notKnown';

/** Shares as the server takes them; they need not sum to 100. A comma is a decimal point too. */
export const asFractions = (lines: readonly ParentLine[]) =>
  lines.map(({ fishId, share }) => ({
    fishId,
    weight: lines.length === 1 ? 1 : Number(share.replace(',', '.')) / 100,
  }));

type Props = {
  side: 'sire' | 'dam';
  animalId: string;
  nodes: Nodes;
  lines: ParentLine[];
  onChange: (lines: ParentLine[]) => void;
};

/** The possible sires, or dams, each with its share; none means that nothing is known. */
export function PossibleParents({ side, animalId, nodes, lines, onChange }: Props) {
  const sex = side === 'sire' ? 'male' : 'female';
  const codes = new Map(nodes.map((node) => [node.id, nameOf(node)]));
  const name = (fishId: string | null) => (fishId ? (codes.get(fishId) ?? 'A fish') : `A ${sex} not known`);
  const free = nodes.filter(
    (node) =>
      node.thing === 'fish' &&
      node.id !== animalId &&
      node.code !== null &&
      (node.sex === sex || node.sex === 'unknown') &&
      !lines.some(({ fishId }) => fishId === node.id),
  );
  const options: Option[] = [
    ...(lines.some(({ fishId }) => fishId === null) ? [] : [{ value: NOT_KNOWN, word: `A ${sex} not known` }]),
    ...free.map((node) => ({ value: node.id, code: node.code ?? '', word: node.living ? '' : 'no longer here' })),
  ];
  const add = (value: string) => onChange([...lines, { fishId: value === NOT_KNOWN ? null : value, share: '50' }]);
  return (
    <Section title={side === 'sire' ? 'Possible sires' : 'Possible dams'} aside={String(lines.length)}>
      <View style={{ gap: space[2] }}>
        {lines.length === 0 ? <Text tone="soft">{`Nothing is known of the ${side}.`}</Text> : null}
        {lines.map((line) => (
          <View key={line.fishId ?? NOT_KNOWN} style={styles.line}>
            <View style={styles.name}>
              <SexShape sex={sex} possible={lines.length > 1} />
              {line.fishId ? <Code>{name(line.fishId)}</Code> : <Text>{name(null)}</Text>}
            </View>
            {lines.length > 1 ? (
              <View style={styles.share}>
                <InputBox
                  aria-label={`Share of ${name(line.fishId)}, percent`}
                  value={line.share}
                  inputMode="decimal"
                  unit="%"
                  onChangeText={(share) => onChange(lines.map((one) => (one === line ? { ...one, share } : one)))}
                />
              </View>
            ) : null}
            <IconButton
              icon="close"
              label={`Leave out ${name(line.fishId)}`}
              onPress={() => onChange(lines.filter((one) => one !== line))}
            />
          </View>
        ))}
        <Select label={`Add a possible ${side}`} options={options} value={null} onChange={add} />
      </View>
    </Section>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  name: { flexDirection: 'row', alignItems: 'center', gap: space[2], flexGrow: 1, flexShrink: 1, minWidth: 0 },
  share: { width: 112 },
});
