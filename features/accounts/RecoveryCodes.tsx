import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { Notice } from '@/components/ui/Notice';

/** Shown once: on the server only their hashes are kept. */
export function RecoveryCodes({ codes, onKept }: { codes: string[]; onKept: () => void }) {
  const [copied, setCopied] = useState(false);
  const copy = async () => {
    await navigator.clipboard.writeText(codes.join('\n'));
    setCopied(true);
  };
  return (
    <View style={{ gap: space[4] }}>
      <Notice
        tone="look"
        alert
        title="Keep these recovery codes"
        words="Each stands in for the authenticator once, when the phone is lost or drowned. They are not shown again."
      />
      <View role="list" aria-label="Recovery codes" style={styles.codes}>
        {codes.map((code) => (
          <View key={code} role="listitem">
            <Code>{code}</Code>
          </View>
        ))}
      </View>
      <Button small icon="copy" label={copied ? 'Copied' : 'Copy the codes'} onPress={() => void copy()} />
      <Button kind="primary" small label="I have kept them" onPress={onKept} />
    </View>
  );
}

const styles = StyleSheet.create({
  codes: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space[6], rowGap: space[2] },
});
