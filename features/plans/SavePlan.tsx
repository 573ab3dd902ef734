import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { Select } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { may } from '@/shared/roles';
import { line, TypedNote } from '@/shared/shapes';
import type { SpeciesProfile } from '@/shared/species/profile';
import { formatVolume } from '@/shared/unitWords';
import { tanksQuery, useAddPlan } from './queries';
import type { Plan } from './usePlan';

const Draft = z.strictObject({ name: line(80, 'Give the plan a name'), note: TypedNote });

type Props = { plan: Plan; strainId: string; profile: SpeciesProfile | null };

/** The plan is kept as it stands; fish are moved when it is carried out, on its own page. */
export function SavePlan({ plan, strainId, profile }: Props) {
  const room = useRoom();
  const router = useRouter();
  const save = useAddPlan();
  const [tanks, setTanks] = useState<(string | null)[]>([]);
  const [id] = useState(newId);
  const { form, notice } = useSchemaForm({
    schema: Draft,
    start: { name: `Plan of ${formatDate(room.today)}`, note: '' },
    save: async ({ name, note }) => {
      const groups = plan.groups.map((group, i) => ({ ...group, tankId: tanks[i] ?? null }));
      await save.mutateAsync({ id, name, content: { strainId, groups, limit: Number(plan.limit), note } });
      router.push(`/r/${room.id}/lineage/plans/${id}`);
    },
  });
  if (!may(room.role, 'plan:write')) return <Notice words="An owner or keeper saves plans and carries them out." />;
  return (
    <Section title="Save the plan">
      <Form form={form} notice={notice} label="Save the plan">
        <View style={{ gap: space[4], maxWidth: 480 }}>
          <TextField name="name" label="Name" />
          {plan.groups.map((group, i) => (
            <TankForGroup
              key={i === 0 ? 'first' : 'second'}
              word={plan.groups.length > 1 ? `Into tank ${i + 1}` : 'Into which tank'}
              heads={group.males.length + group.females.length}
              profile={profile}
              tankId={tanks[i] ?? null}
              onTank={(tankId) => setTanks(plan.groups.map((_group, at) => (at === i ? tankId : (tanks[at] ?? null))))}
            />
          ))}
          <TextField name="note" label="Note" aside="not needed" long />
          <SubmitButton label="Save plan" />
        </View>
      </Form>
    </Section>
  );
}

type TankProps = {
  word: string;
  heads: number;
  profile: SpeciesProfile | null;
  tankId: string | null;
  onTank: (tankId: string) => void;
};

/** The tank with what the species asks of it: advice with its reason, never a refusal. */
export function TankForGroup({ word, heads, profile, tankId, onTank }: TankProps) {
  const room = useRoom();
  const { data: tanks = [] } = useQuery(tanksQuery(room.id));
  const tank = tanks.find(({ id }) => id === tankId);
  const least = profile?.minLitres?.value ?? null;
  const others = tank?.residents.length ?? 0;
  const advice = [
    tank && least !== null && tank.litres < least
      ? `${formatVolume(tank.litres, room.units)} is less than the ${formatVolume(least, room.units)} of ${profile?.name}.`
      : null,
    profile && heads < profile.minGroup.value
      ? `${heads} fish: a group of at least ${profile.minGroup.value} is calmer.`
      : null,
    others > 0 ? 'Others live in it: move them first, or every male with every female counts.' : null,
  ].filter((one) => one !== null);
  return (
    <View style={{ gap: space[2] }}>
      <Text size="small" semi>
        {word}
      </Text>
      <Select
        label={word}
        value={tankId}
        placeholder="Choose later"
        options={tanks.map(({ id, code, litres, residents }) => ({
          value: id,
          code,
          word: formatVolume(litres, room.units),
          note: residents.length === 0 ? 'empty' : residents.map((one) => one.code).join(', '),
        }))}
        onChange={onTank}
      />
      {tank && advice.length > 0 ? <Notice tone="look" words={advice.join(' ')} /> : null}
    </View>
  );
}
