import { Code } from '@/components/ui/Code';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { promiseOf } from '@/shared/buyers/promise';
import type { RequestRow } from '@/shared/buyers/requests';
import { chosenLength, promiseWords, reachedWords } from '@/shared/buyers/words';
import { formatLength } from '@/shared/unitWords';

/** From which broods it can be answered, and whether so many of that length are there. */
export function SourcesPart({ request }: { request: RequestRow }) {
  const { before, place, sources } = request;
  return (
    <Section title="What is there">
      {before > 0 ? (
        <Notice
          words={`${(place ?? 1) - 1} asked for the same before, for ${before} fish. The list is worked in order.`}
        />
      ) : null}
      {sources.length === 0 ? <Text tone="soft">No fish of it are here at the moment.</Text> : null}
      <Rows label="What is there">
        {sources.map((source) => (
          <SourceRow key={source.broodId} source={source} request={request} />
        ))}
      </Rows>
    </Section>
  );
}

type Source = RequestRow['sources'][number];

function SourceRow({ source, request }: { source: Source; request: RequestRow }) {
  const room = useRoom();
  const { code, available, size, broodId } = source;
  return (
    <Row
      href={`/r/${room.id}/buyers/availability/${broodId}`}
      label={`${code}, ${available} available`}
      figure={String(Math.max(0, available))}
      unit="fish"
      title={<Code>{code}</Code>}
      state={size ? <Text strong>{formatLength(size.meanTenthsMm, room.units)}</Text> : 'not measured'}
      note={promisedWords(source, request, room.units)}
    />
  );
}

function promisedWords(
  { available, size }: Source,
  { heads, lengthTenthsMm }: RequestRow,
  units: ReturnType<typeof useRoom>['units'],
): string | undefined {
  if (!size || lengthTenthsMm === null || available <= 0) return undefined;
  const wanted = heads ?? 1;
  const promised = promiseOf(size, available, { heads: wanted, lengthTenthsMm });
  return `${reachedWords(promised, available, chosenLength(lengthTenthsMm, units))} ${promiseWords(promised, wanted)}`;
}
