import { useState } from 'react';
import { View } from 'react-native';
import { chooseFile } from '@/components/form/chooseFile';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import type { ImportAsk, ImportLine } from '@/shared/transfer/contract';
import { IMPORT_KINDS, type ImportKind } from '@/shared/transfer/importFields';
import { CsvPreview } from './CsvPreview';
import { KIND_WORDS } from './kindWords';

const KINDS = IMPORT_KINDS.map((value) => ({ value, ...KIND_WORDS[value] }));
const UNITS: ImportAsk['units'] = { length: 'cm', temperature: 'C', volume: 'L' };

/** A spreadsheet saved as CSV: what it holds, its columns, what is wrong with it, and only then the writing. */
export function CsvPart() {
  const [kind, setKind] = useState<ImportKind>('broods');
  const [ask, setAsk] = useState<ImportAsk | null>(null);
  const [done, setDone] = useState<ImportLine | null>(null);
  const take = async (file: File) => {
    setDone(null);
    setAsk({ kind, fileName: file.name.slice(0, 200), text: await file.text(), columns: null, units: UNITS });
  };
  return (
    <View style={{ gap: space[4], paddingTop: space[3] }}>
      <Text tone="soft">
        A sheet of yours, saved as CSV with a header line. You see beforehand how it was read and what is wrong with it;
        then all of it comes in, or nothing.
      </Text>
      <Select
        label="What the file holds"
        options={KINDS}
        value={kind}
        onChange={(value) => {
          setKind(IMPORT_KINDS.find((one) => one === value) ?? 'broods');
          setAsk(null);
        }}
      />
      <Button
        small
        label={ask ? 'Choose another file' : 'Choose a CSV file'}
        onPress={() => chooseFile('.csv,text/csv', (file) => void take(file))}
      />
      {done ? (
        <Notice
          alert
          title={`${done.rows} lines of ${done.fileName} came in`}
          words="It can be taken back as a whole, below, while nothing was built on it."
        />
      ) : null}
      {ask ? (
        <CsvPreview
          ask={ask}
          onChange={setAsk}
          onDone={(line) => {
            setAsk(null);
            setDone(line);
          }}
        />
      ) : null}
    </View>
  );
}
