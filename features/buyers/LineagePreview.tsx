import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import { KeyValues } from '@/components/ui/KeyValues';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import type { AvailableFish } from '@/shared/buyers/available';

type Parent = AvailableFish['lineage']['parents'][number];
type Slot = Omit<Parent, 'parents'>;

/** Parents and grandparents, as the lineage sheet will say it; what is not certain hangs on a dashed line. */
export function LineagePreview({ fish: { code, lineage } }: { fish: AvailableFish }) {
  const { generation, inbreeding, known, parents, furtherBack } = lineage;
  return (
    <View style={styles.frame}>
      <KeyValues
        pairs={[
          { key: 'Brood', value: <Code>{code}</Code> },
          { key: 'Generation', value: generation },
          { key: 'Inbreeding', value: inbreeding },
          { key: 'Pedigree known', value: known },
        ]}
      />
      {parents.length === 0 ? <Text tone="soft">The parents are not known.</Text> : null}
      {parents.map((parent) => (
        <Branch key={nameOf(parent) + parent.notes.join()} slot={parent}>
          {parent.parents.map((each) => (
            <Branch key={each.role} slot={each} />
          ))}
        </Branch>
      ))}
      <Text size="small" tone="soft">
        {furtherBack > 0 ? `${furtherBack} more ancestors stand on the sheet. ` : ''}A signed lineage sheet goes with
        the fish.
      </Text>
    </View>
  );
}

const nameOf = ({ codes, otherwise }: Slot): string => codes.join(' or ') || otherwise;

function Branch({ slot, children }: { slot: Slot; children?: React.ReactNode }) {
  const theme = useTheme();
  const { role, codes, otherwise, notes, sure } = slot;
  return (
    <View style={[styles.branch, { borderLeftColor: theme.control }, sure ? null : styles.unsure]}>
      <View style={styles.slot}>
        <SexShape sex={role === 'sire' ? 'male' : 'female'} size={16} />
        <Text size="small" strong style={styles.words}>
          {codes.length > 0 ? <Code>{codes.join(' or ')}</Code> : otherwise}
          <Text tone="soft" strong={false}>
            {notes.length > 0 ? `  ${notes.join(' · ')}` : ''}
          </Text>
        </Text>
      </View>
      {children}
    </View>
  );
}

const styles = StyleSheet.create({
  frame: { gap: space[2], marginTop: space[2] },
  branch: { borderLeftWidth: line.section, paddingLeft: space[3], paddingVertical: space[1], marginLeft: space[1] },
  unsure: { borderStyle: 'dashed' },
  slot: { flexDirection: 'row', alignItems: 'baseline', gap: space[2] },
  words: { flexShrink: 1 },
});
