import { useId } from 'react';
import { StyleSheet, View } from 'react-native';
import { FieldError } from '@/components/form/FieldFrame';
import { InputBox } from '@/components/form/InputBox';
import { type Option, Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { IconButton } from '@/components/ui/IconButton';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { Fields } from '@/shared/refusal';
import { type Nodes, nameOf } from './entries';
import { type ParentLine, wrongAt } from './parentsDraft';

const NOT_KNOWN = 'notKnown';

type Props = {
  side: 'sire' | 'dam';
  animalId: string;
  nodes: Nodes;
  lines: ParentLine[];
  onChange: (lines: ParentLine[]) => void;
  wrong: Fields;
  /** What the record says of a parent at the time. */
  noteOf?: (fishId: string | null) => string | null;
};

/** The possible sires, or dams, each with its share; none means that nothing is known. */
export function PossibleParents({ side, animalId, nodes, lines, onChange, wrong, noteOf }: Props) {
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
        {lines.map((line, at) => (
          <ParentRow
            key={line.fishId ?? NOT_KNOWN}
            {...{ line, sex, several: lines.length > 1 }}
            name={name(line.fishId)}
            note={noteOf?.(line.fishId) ?? null}
            wrong={wrongAt(wrong, `${side}s`, at)}
            onShare={(share) => onChange(lines.map((one) => (one === line ? { ...one, share } : one)))}
            onLeaveOut={() => onChange(lines.filter((one) => one !== line))}
          />
        ))}
        <FieldError id={`wrong-${side}`} words={wrong[`parentage.${side}s`] ?? null} />
        <Select
          label={`Add a possible ${side}`}
          placeholder={`Add a possible ${side}`}
          options={options}
          value={null}
          onChange={add}
        />
      </View>
    </Section>
  );
}

type RowProps = {
  line: ParentLine;
  sex: 'male' | 'female';
  several: boolean;
  name: string;
  note: string | null;
  wrong: string | null;
  onShare: (share: string) => void;
  onLeaveOut: () => void;
};

function ParentRow({ line, sex, several, name, note, wrong, onShare, onLeaveOut }: RowProps) {
  const errorId = useId();
  return (
    <View>
      <View style={styles.line}>
        <View style={styles.words}>
          <View style={styles.name}>
            <SexShape sex={sex} possible={several} />
            {line.fishId ? <Code>{name}</Code> : <Text>{name}</Text>}
          </View>
          {note ? (
            <Text size="small" tone="soft">
              {note}
            </Text>
          ) : null}
        </View>
        {several ? (
          <View style={styles.share}>
            <InputBox
              aria-label={`Share of ${name}, percent`}
              value={line.share}
              inputMode="decimal"
              unit="%"
              invalid={wrong !== null}
              aria-describedby={errorId}
              onChangeText={onShare}
            />
          </View>
        ) : null}
        <IconButton icon="close" label={`Leave out ${name}`} onPress={onLeaveOut} />
      </View>
      <FieldError id={errorId} words={wrong} />
    </View>
  );
}

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  words: { flexGrow: 1, flexShrink: 1, minWidth: 0 },
  name: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  share: { width: 112 },
});
