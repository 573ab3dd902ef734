import { StyleSheet, View } from 'react-native';
import { useIsWide } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { useRoom } from '@/hooks/useRoom';
import type { Clock } from '@/shared/holds/clock';
import { clockState } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { modeWords } from './modeWords';

const ACTS = ['strip', 'check', 'release'] as const;
type Act = (typeof ACTS)[number];

/** What can be done with her now; what the day asks for comes first. */
export function HoldActions({ hold, clock }: { hold: HoldRow; clock: Clock | null }) {
  const { id: roomId } = useRoom();
  const wide = useIsWide();
  const mayStrip = hold.mode === null || hold.mode === 'maternalMouthbrooder';
  const first = primaryOf(hold, clock);
  const words: Record<Act, string> = { strip: 'Strip', check: 'Check', release: modeWords(hold.mode).ends.released };
  const acts = ACTS.filter((act) => act !== 'strip' || mayStrip);
  const button = (act: Act) => (
    <Button
      key={act}
      label={words[act]}
      icon={act}
      kind={act === first ? 'primary' : 'plain'}
      grow
      href={`/r/${roomId}/record/${act}?hold=${hold.id}`}
    />
  );
  if (wide) return <View style={[styles.actions, styles.wide]}>{acts.map(button)}</View>;
  return (
    <View style={styles.actions}>
      {button(first)}
      <View style={styles.others}>{acts.filter((act) => act !== first).map(button)}</View>
    </View>
  );
}

function primaryOf(hold: HoldRow, clock: Clock | null): Act {
  const state = clock ? clockState(clock, hold.plan) : 'waiting';
  if (state === 'strip') return 'strip';
  return state === 'release' || state === 'late' || state === 'guarded' ? 'release' : 'check';
}

const styles = StyleSheet.create({
  actions: { gap: space[3], marginBottom: space[6] },
  wide: { flexDirection: 'row', maxWidth: 560 },
  others: { flexDirection: 'row', gap: space[3] },
});
