import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { ActRow } from '@/components/ui/ActRow';
import { Code } from '@/components/ui/Code';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { fromToday } from '@/shared/days';
import type { Today } from '@/shared/today/todayOf';

/** On a phone the loudest few; the rest are on their tanks' pages. */
const SHOWN = 5;

/** Water outside a range, orders that fall short, letters that were not sent: what cannot wait stands first. */
export function Troubles({ today }: { today: Today }) {
  const room = useRoom();
  const home = `/r/${room.id}` as const;
  const { troubles, short, failedLetters } = today;
  if (troubles.length + short.length + failedLetters === 0) return null;
  return (
    <View style={{ gap: space[2], marginBottom: space[5] }}>
      {short.map((order) => (
        <ActRow
          key={order.id}
          href={`${home}/orders/${order.id}`}
          title={`Order ${order.number} falls short by ${order.short}`}
          note="Deaths left fewer than are reserved."
          label={`Order ${order.number} falls short by ${order.short} fish`}
        />
      ))}
      {troubles.slice(0, SHOWN).map(({ tank, finding }) => (
        <ActRow
          key={`${tank.id}:${finding.of}`}
          level={finding.level}
          href={`${home}/tanks/${tank.id}`}
          title={
            <Text strong>
              <Code>{tank.code}</Code> {finding.says}
            </Text>
          }
          note={tank.latest ? `Measured ${fromToday(tank.latest.onDay, room.today)}` : ''}
          label={`${tank.code}: ${finding.says}`}
        />
      ))}
      {troubles.length > SHOWN ? (
        <Text size="small" tone="soft">{`${troubles.length - SHOWN} more on the tanks’ pages`}</Text>
      ) : null}
      {failedLetters > 0 ? (
        <ActRow
          level="look"
          href={`${home}/settings/letters`}
          title={failedLetters === 1 ? 'A letter was not sent' : `${failedLetters} letters were not sent`}
          note="See why, and send again."
          label={`${failedLetters} letters were not sent`}
        />
      ) : null}
    </View>
  );
}
