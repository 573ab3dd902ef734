import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { LedgerRow } from '@/components/ui/LedgerRow';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { formatShortDay } from '@/shared/days';
import { sendLetterAgain } from '@/shared/letters/contract';
import type { OrderPage } from '@/shared/orders/contract';
import { LETTER_KIND_WORDS, LETTER_KINDS } from '@/shared/orders/letterKinds';
import { LetterSheet } from './LetterSheet';
import { useAct } from './queries';

type Owner = NonNullable<OrderPage['owner']>;

const STATE_WORDS = { waiting: 'waiting', sent: 'sent', failed: 'not sent' };

const kindWords = (kind: string): string => {
  const known = LETTER_KINDS.find((one) => one === kind);
  return known ? LETTER_KIND_WORDS[known] : kind;
};

/** The letters that went out, or could not; each can be read before it goes. */
export function LettersPart({ told, letters }: { told: OrderPage; letters: Owner['letters'] }) {
  const { id: roomId } = useRoom();
  const act = useAct();
  const [reading, setReading] = useState(false);
  return (
    <Section title="Letters" aside={letters.length > 0 ? String(letters.length) : undefined}>
      <View style={{ gap: space[2] }}>
        <Rows label="Letters">
          {letters.map(({ id, kind, state, at }) => (
            <LedgerRow
              key={id}
              date={formatShortDay(at.slice(0, 10))}
              event={kindWords(kind)}
              by={STATE_WORDS[state]}
              action={
                state === 'failed' ? (
                  <Button
                    kind="text"
                    small
                    label="Again"
                    describe={`Send again: ${kindWords(kind)}`}
                    onPress={() =>
                      act.mutate(() => call(sendLetterAgain, { params: { roomId, letterId: id }, body: {} }))
                    }
                  />
                ) : undefined
              }
            />
          ))}
        </Rows>
        <ButtonRow>
          <Button small label="Read letters first" onPress={() => setReading(true)} />
        </ButtonRow>
      </View>
      {reading ? <LetterSheet orderId={told.order.id} onClose={() => setReading(false)} /> : null}
    </Section>
  );
}

/** What was done, by whom. */
export function LogPart({ log }: { log: Owner['log'] }) {
  return (
    <Section title="Log">
      <Rows label="Log">
        {log.map(({ id, at, action, by }) => (
          <LedgerRow key={id} date={formatShortDay(at.slice(0, 10))} event={capital(action)} {...(by ? { by } : {})} />
        ))}
      </Rows>
    </Section>
  );
}

const capital = (text: string): string => `${text.slice(0, 1).toUpperCase()}${text.slice(1)}`;
