import type { Href } from 'expo-router';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { IconButton } from '@/components/ui/IconButton';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { ENTRY_LOOKS } from '@/features/entries/looks';
import { useRoom } from '@/hooks/useRoom';
import { detailOf, subjectsOf, titleOf } from './saying';
import type { Waiting } from './waiting';

type Props = {
  entry: Waiting;
  sending: boolean;
  /** The record that it has to wait for. */
  heldBy: Waiting | null;
  codeOf: (id: string) => string | null;
  onUndo: () => void;
  onEdit: () => void;
  /** Sends it as it is: after a refusal, or instead of changing it. */
  onAsItIs: () => void;
  /** Where a conflict is settled; null: there is none. */
  settleHref: Href | null;
};

/** One record that waits here: when it was made, what it says, what can be done with it. */
export function WaitingRow(props: Props) {
  const { entry, sending, heldBy, codeOf, onUndo } = props;
  const room = useRoom();
  const { content, madeAt, picture } = entry;
  const title = titleOf(content);
  const codes = subjectsOf(content).flatMap((id) => codeOf(id) ?? []);
  const detail = detailOf(content, picture?.bytes.byteLength ?? null, room.today);
  return (
    <Row
      margin={
        <Text size="small" align="center" whole>
          {timeOf(madeAt, room.timeZone)}
        </Text>
      }
      lead={<Icon name={ENTRY_LOOKS[content.kind].icon} />}
      title={title}
      note={
        <Text size="small" tone="soft">
          {codes.length > 0 ? <Code>{codes.join(', ')}</Code> : null}
          {codes.length > 0 && detail ? ', ' : ''}
          {detail}
        </Text>
      }
      state={stateWord(entry, sending)}
      waiting
      middle
      {...(entry.state === 'takenBack'
        ? {}
        : { action: <IconButton icon="undo" label={`Undo ${title}`} onPress={onUndo} /> })}
    >
      <View style={styles.below}>
        {heldBy ? <Text size="small">{`Waits for ${titleOf(heldBy.content)}, which it builds on.`}</Text> : null}
        {entry.trouble ? <Text size="small" tone="trouble">{`Not saved. ${troubleWords(entry)}`}</Text> : null}
        <Actions {...props} />
      </View>
    </Row>
  );
}

function Actions({ entry, onEdit, onAsItIs, settleHref }: Props) {
  const { state, trouble, typed } = entry;
  if (state === 'takenBack') return null;
  if (!trouble && state === 'waiting' && !typed) return null;
  return (
    <ButtonRow>
      {settleHref ? <Button label="See both" small kind="primary" href={settleHref} /> : null}
      {typed ? (
        <Button
          label={state === 'editing' ? 'Go on' : 'Change'}
          small
          describe={`Change ${typed.title}`}
          onPress={onEdit}
        />
      ) : null}
      {state === 'editing' || (trouble && !settleHref) ? (
        <Button label={trouble ? 'Send again' : 'Send as it was'} small onPress={onAsItIs} />
      ) : null}
    </ButtonRow>
  );
}

function stateWord({ state }: Waiting, sending: boolean): string | undefined {
  if (state === 'takenBack') return 'undone';
  if (state === 'editing') return 'open in its form';
  return sending ? 'sending' : undefined;
}

function troubleWords({ trouble }: Waiting): string {
  // A conflict's message says it all; of a refusal the field says what to change.
  const [field] = trouble?.reason === 'invalid' ? Object.values(trouble.fields) : [];
  return field && field !== trouble?.message ? `${trouble?.message}. ${field}.` : `${trouble?.message}`;
}

const timeOf = (instant: string, timeZone: string): string =>
  new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit' }).format(new Date(instant));

const styles = StyleSheet.create({ below: { gap: space[2] } });
