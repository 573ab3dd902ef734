import { useField } from 'formik';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { InputBox } from '@/components/form/InputBox';
import { SegmentedField } from '@/components/form/SegmentedField';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { Section } from '@/components/ui/Section';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { type Sire, type SireDraft, type SireLine, sireLines } from './sireDraft';

type Props = {
  sires: readonly Sire[];
  /** The female's strain: a male of another makes a possible hybrid. */
  strainId: string | null;
  tankCode: string;
};

/** Who may be the father, out of the tank at the time, with shares that can be changed. */
export function SireFields({ sires, strainId, tankCode }: Props) {
  const [{ value: draft }, { error }, { setValue }] = useField<SireDraft>('sires');
  const [editing, setEditing] = useState(Object.keys(draft.shares).length > 0);
  const lines = sireLines(sires, draft);
  const inNow = lines.filter(({ on }) => on);
  const startEditing = () => {
    setEditing(true);
    void setValue({ ...draft, shares: Object.fromEntries(inNow.map(({ key, share }) => [key, percent(share)])) });
  };
  const setShare = (key: string, text: string) => void setValue({ ...draft, shares: { ...draft.shares, [key]: text } });
  const toggle = ({ key, fishId, on }: SireLine) => {
    if (fishId === null) void setValue({ ...draft, notKnown: !on });
    else void setValue({ ...draft, off: on ? [...draft.off, key] : draft.off.filter((other) => other !== key) });
  };
  return (
    <Section title="Possible sires" aside={`males in ${tankCode} then`}>
      <View>
        {lines.map((line) => (
          <View key={line.key} style={styles.line}>
            <View style={styles.row}>
              <CheckRow
                on={line.on}
                onChange={() => toggle(line)}
                label={sireName(line)}
                note={editing ? undefined : sireNote(line, strainId, inNow.length > 1)}
              >
                <SireName line={line} />
              </CheckRow>
            </View>
            {editing && line.on ? (
              <View style={styles.share}>
                <InputBox
                  value={draft.shares[line.key] ?? percent(line.share)}
                  onChangeText={(text) => setShare(line.key, text)}
                  inputMode="decimal"
                  selectTextOnFocus
                  unit="%"
                  aria-label={`Share of ${sireName(line)}, percent`}
                />
              </View>
            ) : null}
          </View>
        ))}
      </View>
      {typeof error === 'string' ? (
        <Text size="small" semi tone="trouble" style={styles.under}>
          {error}
        </Text>
      ) : null}
      {inNow.length > 1 && !editing ? <TextLink label="Change the shares" onPress={startEditing} /> : null}
      {editing ? (
        <TextLink
          label="Back to the proposed shares"
          onPress={() => {
            setEditing(false);
            void setValue({ ...draft, shares: {} });
          }}
        />
      ) : null}
      {inNow.length > 1 ? (
        <View style={styles.under}>
          <SegmentedField
            name="paternity"
            label="Fathers of one mouthful"
            choices={[
              { value: 'single', word: 'One, not known which' },
              { value: 'mixed', word: 'Several at once' },
            ]}
          />
        </View>
      ) : null}
    </Section>
  );
}

function SireName({ line: { sire, on } }: { line: SireLine }) {
  const tone = on ? 'ink' : 'faint';
  if (!sire) return <Text tone={tone}>A male not known</Text>;
  return (
    <>
      <SexShape sex={sire.sex} possible={sire.sex === 'unknown'} tone={tone} />
      {sire.code ? <Code tone={tone}>{sire.code}</Code> : <Text tone={tone}>not told apart</Text>}
    </>
  );
}

const sireName = ({ sire }: SireLine): string => (sire ? (sire.code ?? 'A male not told apart') : 'A male not known');

function sireNote({ sire, on, share }: SireLine, strainId: string | null, several: boolean): string {
  const part = on && several ? `${percent(share)} %` : '';
  if (!sire) return part || 'not seen here';
  const seen = sire.dominantDays > 0 ? `dominant ${sire.dominantDays} of ${sire.ofDays} days` : 'present';
  const foreign = strainId && sire.strainId !== strainId ? `${sire.strainCode ?? 'other strain'}: possible hybrid` : '';
  return [part, foreign || seen].filter(Boolean).join(' · ');
}

const percent = (share: number): string => String(Math.round(share * 100));

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  row: { flexGrow: 1, flexShrink: 1, minWidth: 0 },
  share: { width: 112, paddingVertical: space[1] },
  under: { marginTop: space[3] },
});
