import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { chooseFile } from '@/components/form/chooseFile';
import { InputBox } from '@/components/form/InputBox';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { exportTable, importTable, previewTable } from '@/shared/lineage/contract';
import { may } from '@/shared/roles';
import { saveTable } from './saveTable';

/** The pedigree out as a table, and for the owner in: shown row by row what is wrong before anything is written. */
export function TableScreen() {
  const room = useRoom();
  const out = useMutation({
    mutationFn: () => call(exportTable, { params: { roomId: room.id } }),
    onSuccess: ({ text }) => saveTable(text),
  });
  return (
    <Screen title="Pedigree table" back={`/r/${room.id}/lineage`} measure>
      <View style={{ gap: space[4], paddingVertical: space[3] }}>
        <Text tone="soft">
          Comma-separated, one fish a line: id, sire, dam, sex, born, strain. Several possible sires stand as
          MOKA-A01:0.7 MOKA-A02:0.3, a ? for one not known. Fish with the same clutch share one father; write several
          under fathers where each egg may have its own.
        </Text>
        {out.error ? <Notice tone="act" alert words={out.error.message} /> : null}
        <Button icon="download" label="Save the table" busy={out.isPending} onPress={() => out.mutate()} />
      </View>
      {may(room.role, 'data:import') ? <TakeIn /> : null}
    </Screen>
  );
}

function TakeIn() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  const [text, setText] = useState('');
  const sent = { params: { roomId }, body: { text } };
  const check = useMutation({ mutationFn: () => call(previewTable, sent) });
  const take = useMutation({
    mutationFn: () => call(importTable, sent),
    onSuccess: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
  const change = (next: string) => {
    check.reset();
    take.reset();
    setText(next);
  };
  const failed = take.error ?? check.error;
  const clean = check.data && check.data.bad.length === 0;
  return (
    <Section title="Take a table in">
      <View style={{ gap: space[3] }}>
        <View style={{ alignItems: 'flex-start' }}>
          <Button
            icon="upload"
            label="Choose a file"
            onPress={() => chooseFile('.csv,text/csv,text/plain', (file) => void file.text().then(change))}
          />
        </View>
        <InputBox
          aria-label="The table"
          value={text}
          onChangeText={change}
          multiline
          placeholder="or paste it here: id,sire,dam,sex,born,strain"
        />
        {failed ? <Notice tone="act" alert title="Nothing was written" words={failed.message} /> : null}
        {take.data ? <Notice words={`${take.data.rows} fish were added.`} /> : null}
        {check.data && !clean ? <Wrong bad={check.data.bad} /> : null}
        {clean && !take.data ? (
          <Button
            kind="primary"
            label={`Add ${check.data.rows} fish`}
            busy={take.isPending}
            onPress={() => take.mutate()}
          />
        ) : (
          <Button
            label="Check the table"
            busy={check.isPending}
            busyLabel="Checking"
            disabledBecause={text ? null : 'Choose a file or paste the table first'}
            onPress={() => check.mutate()}
          />
        )}
      </View>
    </Section>
  );
}

/** More than these are not read through; the table is mended and checked again. */
const SHOWN = 100;

function Wrong({ bad }: { bad: { line: number; column: string; value: string; says: string }[] }) {
  return (
    <>
      <Notice
        tone="look"
        alert
        title={`${bad.length} cells are wrong`}
        words="Nothing was written. Mend them, and check again."
      />
      <Rows>
        {bad.slice(0, SHOWN).map(({ line, column, value, says }) => (
          <Row
            key={`${line} ${column} ${says}`}
            figure={String(line)}
            unit="line"
            title={`${column}: ${value || 'empty'}`}
            note={says}
          />
        ))}
      </Rows>
    </>
  );
}
