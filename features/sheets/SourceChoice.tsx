import { useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { line, radius, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { CheckAddress, type SheetSource } from '@/shared/sheets/importContract';
import { readSheetFile } from '@/shared/sheets/sheetFile';
import { useDrop } from './useDrop';

const MOST_BYTES = 5_500_000;
const Draft = z.strictObject({ at: CheckAddress });

type Props = { onSource: (source: SheetSource) => void };

/** Where the sheet is: its file, or the address on the paper. */
export function SourceChoice({ onSource }: Props) {
  return (
    <View style={{ gap: space[5] }}>
      <Text tone="soft">
        The fish come in with their ancestors, so that kinship is known across fishrooms. You see all of it before
        anything is written.
      </Text>
      <FileDrop onSource={onSource} />
      <ByAddress onSource={onSource} />
    </View>
  );
}

function FileDrop({ onSource }: Props) {
  const theme = useTheme();
  const zone = useRef<View>(null);
  const [wrong, setWrong] = useState<string | null>(null);
  const take = async (file: File) => {
    const read = file.size > MOST_BYTES ? null : readSheetFile(await file.text());
    if (read) onSource({ from: 'file', ...read, keys: null });
    else setWrong(`${file.name} is not a lineage sheet. Choose the file that ends in .kinwater.json.`);
  };
  const choose = useDrop(zone, (file) => void take(file));
  return (
    <View>
      {wrong ? <Notice tone="look" alert words={wrong} /> : null}
      <View ref={zone} style={[styles.zone, { borderColor: theme.control }]}>
        <Text strong>Drop the sheet’s file here</Text>
        <Text size="small" tone="soft" align="center">
          Its name ends in .kinwater.json. It is checked by the fishroom’s published keys.
        </Text>
        <Button label="Choose the file" icon="upload" onPress={choose} />
      </View>
    </View>
  );
}

function ByAddress({ onSource }: Props) {
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { at: '' },
    save: async ({ at }) => onSource({ from: 'address', at }),
  });
  return (
    <Section title="Or by its address">
      <Form form={form} notice={notice} label="By its address">
        <View style={{ gap: space[3] }}>
          <TextField
            name="at"
            label="The sheet’s check page"
            hint="Printed at the foot of the sheet, and behind its square code"
          />
          <SubmitButton label="Look at it" />
        </View>
      </Form>
    </Section>
  );
}

const styles = StyleSheet.create({
  zone: {
    borderWidth: line.control,
    borderStyle: 'dashed',
    borderRadius: radius.control,
    padding: space[6],
    gap: space[3],
    alignItems: 'center',
  },
});
