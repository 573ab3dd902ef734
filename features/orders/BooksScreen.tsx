import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { KeyValues } from '@/components/ui/KeyValues';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { VirtualList } from '@/components/ui/VirtualList';
import { addressOf } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { formatShortDay } from '@/shared/days';
import { formatMoney } from '@/shared/money';
import { type BookLine, exportBooks, type YearSum } from '@/shared/orders/books';
import { PAYMENT_KIND_WORDS, PAYMENT_METHOD_WORDS } from '@/shared/orders/money';
import { booksQuery } from './queries';

/** A year of the payment ledger: what came in, what went back, and each line of it. */
export function BooksScreen() {
  const room = useRoom();
  const [year, setYear] = useUrlWord<string>('year', '');
  const { data, error, refetch } = useQuery(booksQuery(room.id, year));
  const csv = () =>
    void globalThis.open(
      addressOf(exportBooks, { params: { roomId: room.id }, query: { year: String(data?.year ?? '') } }),
      '_blank',
    );
  return (
    <Screen
      title="Books"
      back={`/r/${room.id}/buyers/orders`}
      measure
      actions={data && data.lines.length > 0 ? <Button small icon="download" label="CSV" onPress={csv} /> : null}
    >
      {data ? (
        <View style={{ gap: space[4] }}>
          <View style={{ maxWidth: 360 }}>
            <Segmented
              label="Year"
              as="tabs"
              choices={data.years.slice(0, 4).map((one) => ({ value: String(one), word: String(one) }))}
              value={String(data.year)}
              onChange={setYear}
            />
          </View>
          {data.lines.length === 0 ? (
            <EmptyState
              small
              title={`No money moved in ${data.year}`}
              words="Payments of orders stand here, and what was given back."
            />
          ) : (
            <>
              <YearPart sum={data.sum} year={data.year} />
              <Section title="Every payment" aside={String(data.lines.length)}>
                <Rows label="Payments">
                  <VirtualList items={data.lines} keyOf={({ id }) => id}>
                    {(line) => <LineOf line={line} />}
                  </VirtualList>
                </Rows>
              </Section>
            </>
          )}
        </View>
      ) : error ? (
        <ErrorState title="The books could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the books" />
      )}
    </Screen>
  );
}

function YearPart({ sum, year }: { sum: YearSum; year: number }) {
  const { currency } = useRoom();
  const money = (cents: number) => formatMoney(cents, currency);
  const moved = sum.months.filter(({ receivedCents, givenCents }) => receivedCents > 0 || givenCents > 0);
  return (
    <Section title={String(year)} aside={`${money(sum.receivedCents - sum.givenCents)} kept`}>
      <KeyValues
        right
        pairs={[
          { key: 'Received', value: money(sum.receivedCents) },
          { key: 'Given back', value: money(sum.givenCents) },
          ...(sum.flaggedCents > 0 ? [{ key: 'Must still go back', value: money(sum.flaggedCents) }] : []),
          ...sum.methods
            .filter(({ receivedCents }) => receivedCents > 0)
            .map(({ method, receivedCents }) => ({
              key: `By ${PAYMENT_METHOD_WORDS[method]}`,
              value: money(receivedCents),
            })),
          ...moved.map(({ month, receivedCents, givenCents }) => ({
            key: formatShortDay(`${month}-01`).slice(2),
            value: money(receivedCents),
            ...(givenCents > 0 ? { note: `${money(givenCents)} given back` } : {}),
          })),
        ]}
      />
    </Section>
  );
}

function LineOf({ line }: { line: BookLine }) {
  const room = useRoom();
  const { orderId, number, buyerName, kind, method, cents, onDay, needsRefund, refundableCents } = line;
  const must = needsRefund && refundableCents > 0;
  const words = `${PAYMENT_KIND_WORDS[kind]}, ${PAYMENT_METHOD_WORDS[method]}, ${formatShortDay(onDay)}`;
  return (
    <Row
      href={`/r/${room.id}/orders/${orderId}`}
      label={`Order ${number}, ${buyerName}, ${formatMoney(cents, room.currency)}, ${words}`}
      title={
        <Text>
          <Code>{String(number)}</Code>
          {`  ${buyerName}`}
        </Text>
      }
      note={must ? `${words}. Must go back` : words}
      trailing={<Text strong>{formatMoney(cents, room.currency)}</Text>}
    />
  );
}
