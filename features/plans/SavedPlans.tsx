import { useQuery } from '@tanstack/react-query';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, formatDate } from '@/shared/days';
import type { PlanRow } from '@/shared/plans/contract';
import { plansQuery } from './queries';

export const STATE_WORDS = { draft: 'Not carried out', carriedOut: 'Carried out', dropped: 'Dropped' };

/** Plans of the strain that were saved, the newest first. */
export function SavedPlans({ strainId }: { strainId: string }) {
  const { id: roomId } = useRoom();
  const { data = [] } = useQuery(plansQuery(roomId));
  const own = data.filter(({ content }) => content.strainId === strainId);
  if (own.length === 0) return null;
  return (
    <Section title="Saved plans" aside={String(own.length)}>
      <Rows label="Saved plans" open>
        {own.map((plan) => (
          <PlanLine key={plan.id} plan={plan} />
        ))}
      </Rows>
    </Section>
  );
}

function PlanLine({ plan }: { plan: PlanRow }) {
  const room = useRoom();
  const { id, name, state, content, colony, gone, by, createdAt } = plan;
  const heads = content.groups.reduce((sum, { males, females }) => sum + males.length + females.length, 0);
  const on = formatDate(dayOf(Date.parse(createdAt), room.timeZone));
  return (
    <Row
      href={`/r/${room.id}/lineage/plans/${id}`}
      label={`${name}, ${heads} fish, ${STATE_WORDS[state]}`}
      figure={String(heads)}
      unit="fish"
      title={name}
      state={STATE_WORDS[state]}
      note={
        <Text size="small" tone={gone.length > 0 && state === 'draft' ? 'trouble' : 'soft'}>
          {gone.length > 0 && state === 'draft'
            ? `Not here any more: ${gone.map(({ code }) => code ?? 'one without a code').join(', ')}`
            : `${colony ? `${colony.code} · ` : ''}${on}, ${by}`}
        </Text>
      }
    />
  );
}
