import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { DateField } from '@/components/form/DateField';
import { Form } from '@/components/form/Form';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Loading } from '@/components/ui/Loading';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { ColonyCode, proposeColonyCode } from '@/shared/codes';
import { DayText } from '@/shared/days';
import type { PlanRow } from '@/shared/plans/contract';
import { formatVolume } from '@/shared/unitWords';
import { colonyCodesQuery, strainsQuery, tanksQuery, useCarryOut, useDropPlan } from './queries';

const Chosen = z.strictObject({
  code: ColonyCode,
  tankId: z.string('Choose a tank').check(z.minLength(1, 'Choose a tank')),
});
const Draft = z.strictObject({ onDay: DayText, colonies: z.array(Chosen) });

/** Makes the colony of it: members from that day, and a task for each tank that fish are netted from. */
export function CarryOut({ plan }: { plan: PlanRow }) {
  const { id: roomId } = useRoom();
  const { data: taken } = useQuery(colonyCodesQuery(roomId));
  const { data: strains } = useQuery(strainsQuery(roomId));
  if (!taken || !strains) return <Loading label="Loading" />;
  const stem = strains.find(({ id }) => id === plan.content.strainId)?.code ?? 'X';
  const first = proposeColonyCode(stem, taken);
  const codes = [first, proposeColonyCode(stem, new Set([...taken, first]))];
  return <Fields plan={plan} codes={codes} />;
}

function Fields({ plan, codes }: { plan: PlanRow; codes: string[] }) {
  const room = useRoom();
  const { data: tanks = [] } = useQuery(tanksQuery(room.id));
  const carry = useCarryOut(plan.id);
  const drop = useDropPlan(plan.id);
  const [ids] = useState(() => plan.content.groups.map(() => newId()));
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: {
      onDay: room.today,
      colonies: plan.content.groups.map(({ tankId }, i) => ({ code: codes[i] ?? '', tankId: tankId ?? '' })),
    },
    save: async ({ onDay, colonies }) => {
      const named = colonies.map((colony, i) => ({ ...colony, id: ids[i] ?? newId() }));
      await carry.mutateAsync({ version: plan.version, onDay, colonies: named });
    },
  });
  return (
    <Section title="Carry it out">
      <Form form={form} notice={notice} label="Carry it out">
        <View style={{ gap: space[4], maxWidth: 480 }}>
          <Text tone="soft">
            The fish become a colony, members from that day. A task for each tank they are in says whom to net.
          </Text>
          {plan.content.groups.map((group, i) => (
            <View key={group.males.join()} style={{ gap: space[4] }}>
              <TextField name={`colonies.${i}.code`} label="Colony" mono autoCapitalize="characters" />
              <SelectField
                name={`colonies.${i}.tankId`}
                label="In which tank"
                options={tanks.map(({ id, code, litres }) => ({
                  value: id,
                  code,
                  word: formatVolume(litres, room.units),
                }))}
              />
            </View>
          ))}
          <DateField name="onDay" label="Together from" today={room.today} />
          <SubmitButton label="Carry it out" />
          <Button
            kind="text"
            label="Drop this plan"
            onPress={() => void drop.mutateAsync({ version: plan.version }).catch(() => undefined)}
          />
        </View>
      </Form>
    </Section>
  );
}
