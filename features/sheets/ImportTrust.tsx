import { useState } from 'react';
import { View } from 'react-native';
import { InputBox } from '@/components/form/InputBox';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { formatDate } from '@/shared/days';
import type { ImportPreview, SheetSource } from '@/shared/sheets/importContract';
import { trustWords } from '@/shared/sheets/importWords';
import { pastedKeys } from './keysFor';

type Props = { preview: ImportPreview; source: SheetSource; onSource: (source: SheetSource) => void };

/** What is known of the signature, and of the sheet since it was issued. */
export function ImportTrust({ preview: { trust, recalled }, source, onSource }: Props) {
  const { word, says } = trustWords(trust);
  const checked = trust.signature === 'valid';
  return (
    <View>
      {recalled?.state === 'replaced' ? (
        <Notice
          tone="look"
          title={`Replaced on ${formatDate(recalled.on)}`}
          words="The fishroom has issued another sheet in its place. Ask for that one, or take it in later as well."
        />
      ) : null}
      <Notice tone={checked ? 'tell' : 'look'} title={word} words={trust.why ?? says}>
        {checked || source.from !== 'file' ? null : <PasteKeys onKeys={(keys) => onSource({ ...source, keys })} />}
      </Notice>
    </View>
  );
}

type PasteProps = { onKeys: (keys: Extract<SheetSource, { from: 'file' }>['keys']) => void };

/** Keys that the keeper got from the fishroom in another way. */
function PasteKeys({ onKeys }: PasteProps) {
  const [text, setText] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const check = () => {
    try {
      onKeys(pastedKeys(text).found.keys);
    } catch (error) {
      setWrong(error instanceof Error ? error.message : null);
    }
  };
  return (
    <View style={{ gap: space[2], alignSelf: 'stretch', flexGrow: 1 }}>
      <InputBox
        aria-label="The fishroom’s keys"
        value={text}
        onChangeText={setText}
        multiline
        placeholder="{&quot;keys&quot;: […]}"
      />
      {wrong ? (
        <Text size="small" tone="trouble">
          {wrong}
        </Text>
      ) : null}
      <Button small label="Check with these keys" onPress={check} />
    </View>
  );
}
