import { useQuery } from '@tanstack/react-query';
import { Code } from '@/components/ui/Code';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { formatLength } from '@/shared/unitWords';
import { stockQuery } from './queries';

/** The colonies and broods of one strain. */
export function StockOfStrain({ strainId }: { strainId: string }) {
  const room = useRoom();
  const { data } = useQuery(stockQuery(room.id));
  const colonies = data?.colonies.filter((one) => one.strainId === strainId) ?? [];
  const broods = data?.broods.filter((one) => one.strainId === strainId) ?? [];
  return (
    <>
      {colonies.length > 0 ? (
        <Section title="Colonies" aside={String(colonies.length)}>
          <Rows>
            {colonies.map(({ id, code, males, females, unsexed, tank, openHolds }) => (
              <Row
                key={id}
                href={`/r/${room.id}/colonies/${id}`}
                label={`${code}, ${males + females + unsexed} fish`}
                figure={String(males + females + unsexed)}
                unit="fish"
                title={<Code>{code}</Code>}
                note={tank ? `in ${tank.code}` : 'in no tank'}
                {...(openHolds > 0 ? { state: `${openHolds} holding` } : {})}
              />
            ))}
          </Rows>
        </Section>
      ) : null}
      {broods.length > 0 ? (
        <Section title="Broods" aside={String(broods.length)}>
          <Rows>
            {broods.map(({ id, code, heads, opened, lastSample, tanks }) => (
              <Row
                key={id}
                href={`/r/${room.id}/broods/${id}`}
                label={`${code}, ${Math.round(heads)} heads`}
                figure={opened === null ? '–' : String(Math.round(heads))}
                unit={opened === null ? 'not yet' : 'heads'}
                title={<Code>{code}</Code>}
                note={tanks.map((tank) => tank.code).join(', ')}
                {...(lastSample ? { trailing: formatLength(lastSample.meanTenthsMm, room.units) } : {})}
              />
            ))}
          </Rows>
        </Section>
      ) : null}
    </>
  );
}
