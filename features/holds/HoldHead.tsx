import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Figure } from '@/components/ui/Figure';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { dayWords } from '@/shared/days';
import type { Clock } from '@/shared/holds/clock';
import { clockState, daysHeld, nextInClock } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { OUTCOME_WORDS } from '@/shared/holds/entries';
import { spawnWords } from './ClashFacts';
import { modeWords } from './modeWords';

type Props = { hold: HoldRow; clock: Clock | null; note: string | null };

/** The day, when she spawned, and what comes next; of one that is over, how it ended. */
export function HoldHead({ hold, clock, note }: Props) {
  const room = useRoom();
  const days = daysHeld(hold, hold.endedOn ?? room.today);
  const words = modeWords(hold.mode);
  const over = hold.endedOn !== null;
  return (
    <View style={styles.head}>
      <View style={styles.line} role="group" aria-label={`Day ${days}`}>
        <Figure size="xl">{String(days)}</Figure>
        <View style={styles.words}>
          <Text size="title" strong>
            {over ? (days === 1 ? 'day' : 'days') : words.dayOf}
          </Text>
          <Text size="small" tone="soft">{`Spawn ${spawnWords(hold, room.today)}`}</Text>
          <Text size="small" strong>
            {over && hold.outcome && hold.endedOn
              ? `${endWords(hold.outcome, words.ends)} ${dayWords(hold.endedOn, room.today)}`
              : clock
                ? stateWords(clock, hold.plan)
                : 'How long this species holds is not known here'}
          </Text>
        </View>
      </View>
      {hold.brood ? (
        <TextLink
          label={`To the brood ${hold.brood.code}`}
          describe={`To the brood ${hold.brood.code}`}
          href={`/r/${room.id}/broods/${hold.brood.id}`}
        />
      ) : null}
      {note ? <Text style={styles.note}>{note}</Text> : null}
    </View>
  );
}

const endWords = (outcome: keyof typeof OUTCOME_WORDS, own: Record<string, string>): string =>
  own[outcome] === 'Free-swimming' ? 'Free-swimming' : OUTCOME_WORDS[outcome];

/** "Strip window open until Wed 20 May", else what comes next. */
function stateWords(clock: Clock, plan: HoldRow['plan']): string {
  const { stripTo, handOverTo, today } = clock;
  const state = clockState(clock, plan);
  if (state === 'strip' && stripTo) return `Strip window open until ${dayWords(stripTo, today)}`;
  if (state === 'handOver' && handOverTo) return `May hand over until ${dayWords(handOverTo, today)}`;
  return nextInClock(clock, plan);
}

const styles = StyleSheet.create({
  head: { marginBottom: space[3] },
  line: { flexDirection: 'row', alignItems: 'center', gap: space[5], paddingVertical: space[1] },
  words: { flexShrink: 1, flexGrow: 1 },
  note: { marginTop: space[2] },
});
