import { useQuery } from '@tanstack/react-query';
import { use, useState } from 'react';
import { View } from 'react-native';
import { LengthStrip } from '@/components/chart/LengthStrip';
import { InputBox } from '@/components/form/InputBox';
import { NumberKeypad } from '@/components/form/NumberKeypad';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Loading } from '@/components/ui/Loading';
import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { newId, ToldContext, useRecord } from '@/features/entries';
import { useLeave } from '@/features/entries/useLeave';
import { useRoom } from '@/hooks/useRoom';
import type { Day } from '@/shared/days';
import { METHOD_WORDS, METHODS } from '@/shared/growth/entries';
import { isOdd, sampleStats } from '@/shared/growth/sampleStats';
import { Refusal } from '@/shared/refusal';
import { TenthsMm } from '@/shared/units';
import { pastedLengths } from './pastedLengths';
import { type SamplesOf, samplesQuery } from './queries';
import { SampleDay } from './SampleDay';
import { useKeptSample } from './useKeptSample';

type Props = { of: SamplesOf; subtitle: string };

/** So many show the mean of a usual brood to about 5 %. */
const ENOUGH = 15;

/** Lengths one after the other, in millimetres, with a wet thumb; or pasted as a list. */
export function SampleForm({ of, subtitle }: Props) {
  const room = useRoom();
  const { data } = useQuery(samplesQuery(room.id, of));
  if (!data) return <Loading label="Loading earlier samples" />;
  const last = data.samples.at(-1);
  return <Taking of={of} subtitle={subtitle} measured={last?.measure ?? null} method={last?.method ?? 'ruler'} />;
}

type TakingProps = Props & { measured: 'total' | 'standard' | null; method: (typeof METHODS)[number] };

function Taking({ of, subtitle, measured, method: usual }: TakingProps) {
  const { today } = useRoom();
  const kept = useKeptSample(of);
  const { lengths, setLengths } = kept;
  const [typed, setTyped] = useState('');
  const [asking, setAsking] = useState<number | null>(null);
  const [measure, setMeasure] = useState<'total' | 'standard'>(measured ?? 'total');
  const [method, setMethod] = useState(usual);
  const [pasting, setPasting] = useState(false);
  const [onDay, setOnDay] = useState(today);
  const { save, busy, trouble } = useSave({ of, onDay, measure, method, lengths, done: kept.drop });
  const leave = useLeave();
  const { tell } = use(ToldContext);
  const stats = lengths.length > 0 ? sampleStats(lengths) : null;
  const take = (mm: number) => {
    setLengths([...lengths, mm]);
    setTyped('');
    setAsking(null);
  };
  const next = () => {
    const mm = Number(typed.replace(',', '.'));
    if (!Number.isFinite(mm) || mm <= 0) return;
    if (asking !== mm && isOdd(mm, lengths)) setAsking(mm);
    else take(mm);
  };
  const close = () => {
    if (lengths.length > 0)
      tell({ is: 'draft', title: 'Length sample', href: globalThis.location.pathname + globalThis.location.search });
    leave();
  };
  return (
    <Screen
      title="Length sample"
      subtitle={subtitle}
      close={{
        label: lengths.length > 0 ? 'Close Length sample, keep the draft' : 'Close Length sample',
        onPress: close,
      }}
      actions={
        <Menu
          label="How"
          items={[
            { word: pasting ? 'Use the keypad' : 'Paste a list', onPress: () => setPasting(!pasting) },
            ...METHODS.map((one) => ({ word: METHOD_WORDS[one], on: one === method, onPress: () => setMethod(one) })),
          ]}
        />
      }
      low
      measure
      dock={
        pasting ? undefined : (
          <View style={{ flexGrow: 1 }}>
            <NumberKeypad
              value={typed}
              title={`Fish ${lengths.length + 1}`}
              note={
                lengths.length < ENOUGH ? `${ENOUGH - lengths.length} more makes ${ENOUGH}` : 'Enough for a good mean'
              }
              question={asking === null ? null : `${asking} mm is far from the others. Keep it?`}
              unit="mm"
              tape={lengths.slice(-5).map(String)}
              onChange={setTyped}
              nextWord="Next fish"
              onNext={next}
              {...(lengths.length > 0 ? { finishWord: busy ? 'Saving' : 'Finish sample', onFinish: save } : {})}
            />
          </View>
        )
      }
    >
      <View style={{ gap: space[4] }}>
        <SampleDay day={onDay} onDay={setOnDay} />
        <Segmented
          label="Measured as"
          value={measure}
          onChange={setMeasure}
          choices={[
            { value: 'total', word: 'Total length' },
            { value: 'standard', word: 'Standard length' },
          ]}
        />
        {measured && measure !== measured ? (
          <Notice
            tone="look"
            words={`Earlier samples are ${measured} length. The two are never mixed: these will not join the curve.`}
          />
        ) : null}
        <FiguresStrip
          figures={[
            { figure: String(lengths.length), label: 'fish' },
            { figure: stats ? stats.mean.toFixed(1) : '–', label: 'mean, mm' },
            {
              figure: stats?.cv ? String(Math.round(stats.cv * 100)) : '–',
              after: stats?.cv ? '%' : undefined,
              label: 'CV',
            },
          ]}
        />
        {stats ? (
          <LengthStrip
            lengths={lengths}
            mean={stats.mean}
            sd={stats.sd}
            stage="juvenile"
            sentence={`${lengths.length} fish, mean ${stats.mean.toFixed(1)} mm`}
          />
        ) : null}
        {lengths.length > 0 ? (
          <Button
            small
            kind="text"
            icon="undo"
            label={`Take back ${lengths.at(-1)} mm`}
            onPress={() => setLengths(lengths.slice(0, -1))}
          />
        ) : null}
        {trouble ? <Notice tone="act" alert words={trouble} /> : null}
        {pasting ? (
          <Paste take={(more) => setLengths([...lengths, ...more])} save={save} count={lengths.length} />
        ) : null}
      </View>
    </Screen>
  );
}

function Paste({ take, save, count }: { take: (lengths: number[]) => void; save: () => void; count: number }) {
  const [text, setText] = useState('');
  const { lengths, wrong } = pastedLengths(text);
  return (
    <View style={{ gap: space[3] }}>
      <Text size="small" tone="soft">
        Lengths in mm, parted by spaces, commas with a space, or lines: 32 33,5 31
      </Text>
      <InputBox value={text} onChangeText={setText} multiline aria-label="Lengths in mm" />
      {wrong.length > 0 ? <Notice tone="look" words={`Not a length: ${wrong.slice(0, 5).join(', ')}`} /> : null}
      <View style={{ flexDirection: 'row', gap: space[2] }}>
        <Button
          small
          label={`Take ${lengths.length} lengths`}
          {...(lengths.length === 0 || wrong.length > 0
            ? { disabledBecause: wrong.length > 0 ? 'Mend what is no length first' : 'Paste some lengths first' }
            : {})}
          onPress={() => {
            take(lengths);
            setText('');
          }}
        />
        {count > 0 ? <Button small kind="primary" label="Finish sample" onPress={save} /> : null}
      </View>
    </View>
  );
}

type Saving = {
  of: SamplesOf;
  onDay: Day;
  measure: 'total' | 'standard';
  method: (typeof METHODS)[number];
  lengths: number[];
  done: () => void;
};

function useSave({ of, onDay, measure, method, lengths, done }: Saving) {
  const record = useRecord();
  const leave = useLeave();
  const [busy, setBusy] = useState(false);
  const [trouble, setTrouble] = useState<string | null>(null);
  const [ids] = useState(() => ({ sample: newId(), entry: newId() }));
  const save = async () => {
    setBusy(true);
    try {
      await record(
        {
          kind: 'lengthSampled',
          sampleId: ids.sample,
          of: { thing: of.thing, id: of.thingId },
          onDay,
          measure,
          method,
          note: null,
          readings: lengths.map((mm) => ({ lengthTenthsMm: TenthsMm.parse(Math.round(mm * 10)), weightG: null })),
        },
        { id: ids.entry },
      );
      done();
      leave();
    } catch (error) {
      if (!(error instanceof Error)) throw error;
      setTrouble(error instanceof Refusal ? error.message : `${error.message} The lengths are still here.`);
    } finally {
      setBusy(false);
    }
  };
  return { save: () => void save(), busy, trouble };
}
