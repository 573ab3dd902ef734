import { useQuery } from '@tanstack/react-query';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { useRoom } from '@/hooks/useRoom';
import { type Found, foundIn } from './finding';
import { stockQuery } from './queries';

const MOST = 40;
const KIND_WORDS: Record<Found['kind'], string> = {
  colonies: 'colony',
  broods: 'brood',
  tanks: 'tank',
  fish: 'fish',
  strains: 'strain',
};

/** Found in what this device last saw of the stock: without a signal there is no other search. */
export function StockFound({ search }: { search: string }) {
  const { id: roomId } = useRoom();
  const { data } = useQuery(stockQuery(roomId));
  if (!data) return <EmptyState small title="Nothing to search here" words="This device has not seen the stock yet." />;
  const found = foundIn(data, search);
  if (found.length === 0) return <EmptyState small title="Nothing is called that" words="Search for part of a code." />;
  return (
    <Rows label="Found">
      {found.slice(0, MOST).map(({ kind, id, code, note }) => (
        <Row
          key={id}
          href={`/r/${roomId}/${kind}/${id}`}
          label={`${code}, ${KIND_WORDS[kind]}`}
          title={<Code>{code}</Code>}
          {...(note ? { note } : {})}
          trailing={KIND_WORDS[kind]}
          end={<Icon name="next" tone="soft" />}
          middle
        />
      ))}
    </Rows>
  );
}
