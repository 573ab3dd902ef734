import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { View } from 'react-native';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SelectField } from '@/components/form/Select';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { proposeTankCode } from '@/shared/codes';
import { TANK_PURPOSE_WORDS, TANK_PURPOSES, type TankRow } from '@/shared/tanks/contract';
import { tankQuery, tanksQuery, useAddTank, useChangeTank } from './queries';
import { emptyTank, type TankDraft, tankAsTyped, tankDraft } from './tankForm';

export function NewTankScreen() {
  const room = useRoom();
  const router = useRouter();
  const { data } = useQuery(tanksQuery(room.id));
  const add = useAddTank();
  if (!data)
    return (
      <Screen title="New tank">
        <Loading />
      </Screen>
    );
  const taken = new Set(data.tanks.map(({ code }) => code));
  const order = Math.max(0, ...data.tanks.map(({ walkOrder }) => walkOrder)) + 1;
  return (
    <TankForm
      title="New tank"
      start={emptyTank(proposeTankCode(taken), order)}
      save={async (facts) => {
        const { id } = await add.mutateAsync({ id: newId(), ...facts });
        router.replace(`/r/${room.id}/tanks/${id}`);
      }}
    />
  );
}

export function ChangeTankScreen({ tankId }: { tankId: string }) {
  const room = useRoom();
  const { data } = useQuery(tankQuery(room.id, tankId));
  return data ? (
    <ChangeTank tank={data.tank} />
  ) : (
    <Screen title="Tank">
      <Loading />
    </Screen>
  );
}

function ChangeTank({ tank }: { tank: TankRow }) {
  const room = useRoom();
  const router = useRouter();
  const change = useChangeTank(tank.id);
  return (
    <TankForm
      title={tank.code}
      start={tankAsTyped(tank, room.units)}
      save={async (facts) => {
        await change.mutateAsync({ ...facts, version: tank.version, retiredOn: tank.retiredOn });
        router.back();
      }}
    />
  );
}

type Facts = Parameters<ReturnType<typeof useChangeTank>['mutateAsync']>[0];
type FormProps = {
  title: string;
  start: TankDraft;
  save: (facts: Omit<Facts, 'version' | 'retiredOn'>) => Promise<void>;
};

function TankForm({ title, start, save }: FormProps) {
  const room = useRoom();
  const router = useRouter();
  const { units } = room;
  const { form, notice } = useSchemaForm({ schema: tankDraft(units), start, save });
  const side = units.length === 'in' ? 'in' : 'cm';
  const volume = { L: 'L', usGal: 'US gal', impGal: 'imp gal' }[units.volume];
  return (
    <Form form={form} notice={notice} label={title} page>
      <Screen
        title={title}
        close={{ label: `Close ${title}`, onPress: () => router.back() }}
        dock={<SubmitButton label="Save tank" />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          <TextField name="code" label="Code, as painted on the glass" mono />
          <NumberField name="litres" label="Water in it" unit={volume} />
          <SelectField
            name="purpose"
            label="What for"
            options={TANK_PURPOSES.map((value) => ({ value, word: TANK_PURPOSE_WORDS[value] }))}
          />
          <TextField name="place" label="Place" hint="Rack and shelf, as you would tell a helper" />
          <NumberField
            name="heaterC"
            label="Heater set to"
            unit={units.temperature === 'F' ? '°F' : '°C'}
            hint="Leave it empty where there is none"
          />
          <NumberField name="walkOrder" label="Place on the round" whole hint="Rounds walk the tanks in this order" />
          <Section title="Sides" aside="for weight and floor load">
            <View style={{ gap: space[3] }}>
              <NumberField name="lengthTenthsMm" label="Length" unit={side} />
              <NumberField name="widthTenthsMm" label="Width" unit={side} />
              <NumberField name="heightTenthsMm" label="Height" unit={side} />
              <NumberField name="fillTenthsMm" label="Depth of water" unit={side} />
              <NumberField name="glassTenthsMm" label="Glass" unit={side} />
            </View>
          </Section>
          <TextField name="note" label="Note" long />
        </View>
      </Screen>
    </Form>
  );
}
