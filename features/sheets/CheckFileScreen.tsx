import { useMutation } from '@tanstack/react-query';
import { lazy, Suspense, useRef, useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { InputBox } from '@/components/form/InputBox';
import { line, radius, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { formatDate } from '@/shared/days';
import type { SheetVerdict } from '@/shared/sheets/checkSheet';
import { type Recalled, readSheetFile } from '@/shared/sheets/sheetFile';
import { VerdictNotice } from './CheckScreen';
import { keysFor, pastedKeys } from './keysFor';
import { TakeInOffer } from './TakeInOffer';
import { useDrop } from './useDrop';
import { digestOf, verifySheet } from './verifySheet';

const SheetPaper = lazy(() => import('./SheetPaper').then((module) => ({ default: module.SheetPaper })));

const MOST_BYTES = 24_000_000;

type FileChecked = { verdict: SheetVerdict; recalled: Recalled | null };

/** A sheet's file, dropped or chosen, from here or from anywhere: checked in this browser by keys that our server fetches. */
export function CheckFileScreen() {
  const theme = useTheme();
  const [keys, setKeys] = useState('');
  const [text, setText] = useState<string | null>(null);
  const zone = useRef<View>(null);
  const check = useMutation({ mutationFn: checkText });
  const take = async (file: File) => {
    const read = file.size > MOST_BYTES ? '' : await file.text();
    setText(read);
    check.mutate({ text: read, pasted: keys });
  };
  const choose = useDrop(zone, (file) => void take(file));
  return (
    <Screen title="Check a lineage sheet" measure>
      <View style={{ gap: space[4] }}>
        <View ref={zone} style={[styles.zone, { borderColor: theme.control }]}>
          <Text strong>Drop the sheet’s file here</Text>
          <Text size="small" tone="soft" align="center">
            Its name ends in .kinwater.json. It is read in this browser; our server is only asked for the fishroom’s
            keys.
          </Text>
          <Button label="Choose the file" icon="upload" onPress={choose} />
        </View>
        <View style={{ gap: space[2] }}>
          <Text strong>The fishroom’s keys</Text>
          <Text size="small" tone="soft">
            Left empty, they are fetched from the address in the file. Paste them where that cannot be reached.
          </Text>
          <InputBox
            aria-label="The fishroom’s keys"
            value={keys}
            onChangeText={setKeys}
            multiline
            placeholder="{&quot;keys&quot;: […]}"
          />
          {text !== null && keys ? (
            <Button small label="Check again with these keys" onPress={() => check.mutate({ text, pasted: keys })} />
          ) : null}
        </View>
        {check.isPending ? <Loading label="Checking the sheet" rows={2} /> : null}
        {check.error ? <Notice tone="look" alert words={check.error.message} /> : null}
        {check.data?.recalled ? <RecalledNotice {...check.data.recalled} /> : null}
        {check.data ? <VerdictNotice verdict={check.data.verdict} /> : null}
        {check.data?.verdict.state === 'valid' && check.data.recalled?.state !== 'withdrawn' ? (
          <TakeInOffer checkUrl={null} issuer={check.data.verdict.content.fishroom.id} />
        ) : null}
        {check.data?.verdict.state === 'valid' ? (
          <Suspense fallback={<Loading label="Setting the page" rows={6} />}>
            <SheetPaper
              content={check.data.verdict.content}
              paper="a4"
              checkUrl={`${check.data.verdict.content.fishroom.address}/sheet`}
            />
          </Suspense>
        ) : null}
      </View>
    </Screen>
  );
}

/** What the fishroom itself says of the sheet since: its signature stands, and it does not count any more. */
function RecalledNotice({ state, on }: Recalled) {
  return state === 'withdrawn' ? (
    <Notice tone="act" alert title={`Withdrawn on ${formatDate(on)}`} words="The fishroom has taken this sheet back." />
  ) : (
    <Notice tone="look" title={`Replaced on ${formatDate(on)}`} words="Ask for the sheet that takes its place." />
  );
}

async function checkText({ text, pasted }: { text: string; pasted: string }): Promise<FileChecked> {
  const file = readSheetFile(text);
  if (!file) return { verdict: { state: 'notASheet', because: 'form' }, recalled: null };
  const { found, recalled } = pasted.trim() ? pastedKeys(pasted) : await keysFor(file.keysAt);
  const verdict = await verifySheet(file.jws, found);
  const digest = verdict.state === 'valid' ? await digestOf(file.jws) : null;
  return { verdict, recalled: recalled.find(({ sheet }) => sheet === digest) ?? null };
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
