import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useMyDay } from './queries';

/** The secret address that a phone's calendar subscribes to. */
export function CalendarPart({ url }: { url: string | null }) {
  const { makeCalendar, dropCalendar } = useMyDay();
  const error = makeCalendar.error ?? dropCalendar.error;
  return (
    <Section title="Calendar">
      <View style={{ gap: space[4] }}>
        <Text tone="soft">
          What is due and will be, as days in your own calendar. Subscribe to the address there; it looks again by
          itself.
        </Text>
        {error ? <Notice tone="act" alert words={error.message} /> : null}
        {url ? (
          <Address key={url} url={url} />
        ) : (
          <Button
            icon="calendar"
            label="Make a calendar address"
            busy={makeCalendar.isPending}
            busyLabel="Making it"
            onPress={() => makeCalendar.mutate()}
          />
        )}
      </View>
    </Section>
  );
}

function Address({ url }: { url: string }) {
  const [copied, setCopied] = useState(false);
  const [asking, setAsking] = useState(false);
  return (
    <>
      <View>
        <Code size="small" style={{ whiteSpace: 'normal', overflowWrap: 'anywhere' }}>
          {url}
        </Code>
        <Text size="small" tone="soft" style={{ marginTop: space[2] }}>
          Whoever has it can read along: tanks, codes and days, no money and no buyer’s name.
        </Text>
      </View>
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
        <Button
          icon="copy"
          label={copied ? 'Copied' : 'Copy the address'}
          onPress={() => void navigator.clipboard.writeText(url).then(() => setCopied(true))}
        />
        <Button kind="text" label="Change or end it" onPress={() => setAsking(!asking)} />
      </View>
      {asking ? <Ending onKeep={() => setAsking(false)} /> : null}
    </>
  );
}

/** Asked once more: a calendar that is subscribed to the old address gets nothing from then on. */
function Ending({ onKeep }: { onKeep: () => void }) {
  const { makeCalendar, dropCalendar } = useMyDay();
  return (
    <Notice
      tone="look"
      alert
      title="The address above ends at once"
      words="Calendars that are subscribed to it get nothing from then on."
    >
      <Button small label="Make a new address" busy={makeCalendar.isPending} onPress={() => makeCalendar.mutate()} />
      <Button small label="End it" busy={dropCalendar.isPending} onPress={() => dropCalendar.mutate()} />
      <Button small kind="text" label="Keep it" onPress={onKeep} />
    </Notice>
  );
}
