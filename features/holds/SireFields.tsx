import { useField } from 'formik';
import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { CheckRow } from '@/components/form/CheckRow';
import { InputBox } from '@/components/form/InputBox';
import { SegmentedField } from '@/components/form/SegmentedField';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { Part } from '@/features/entries/Part';
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
    <Part title="Possible sires" aside={`males in ${tankCode} then`}>
      <View>
        {lines.map((line) => (
          <View key={line.key} style={styles.line}>
            <View style={styles.row}>
              <CheckRow
                on={line.on}
                onChange={() => toggle(line)}
                label={`${sireName(line)}${line.on && inNow.length > 1 ? `, ${percent(line.share)} %` : ''}`}
                note={editing ? undefined : <Share line={line} several={inNow.length > 1} />}
              >
                <SireName line={line} strainId={strainId} />
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
    </Part>
  );
}

function SireName({ line, strainId }: { line: SireLine; strainId: string | null }) {
  const { sire, on } = line;
  const tone = on ? 'ink' : 'faint';
  return (
    <View style={styles.name}>
      <View style={styles.code}>
        {sire ? <SexShape sex={sire.sex} possible={sire.sex === 'unknown'} tone={tone} /> : null}
        {sire?.code ? <Code tone={tone}>{sire.code}</Code> : <Text tone={tone}>{sireName(line)}</Text>}
      </View>
      {sire ? (
        <Text size="small" tone="soft">
          {sireNote(sire, strainId)}
        </Text>
      ) : null}
    </View>
  );
}

function Share({ line: { on, share }, several }: { line: SireLine; several: boolean }) {
  return on && several ? <Text strong whole>{`${percent(share)} %`}</Text> : null;
}

const sireName = ({ sire }: SireLine): string => (sire ? (sire.code ?? 'A male not told apart') : 'A male not known');

function sireNote({ dominantDays, ofDays, strainId, strainCode }: Sire, motherStrainId: string | null): string {
  const seen = dominantDays > 0 ? `Dominant ${dominantDays} of ${ofDays} days` : 'Present';
  const foreign = motherStrainId !== null && strainId !== motherStrainId;
  return foreign ? `${seen}. Of ${strainCode ?? 'another strain'}: possible hybrid` : seen;
}

const percent = (share: number): string => String(Math.round(share * 100));

const styles = StyleSheet.create({
  line: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  row: { flexGrow: 1, flexShrink: 1, minWidth: 0 },
  name: { flexShrink: 1 },
  code: { flexDirection: 'row', alignItems: 'center', gap: space[2] },
  share: { width: 112, paddingVertical: space[1] },
  under: { marginTop: space[3] },
});
