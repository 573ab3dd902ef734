import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { MiniDayBars } from '@/components/ui/MiniDayBars';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { SexShape } from '@/components/ui/SexShape';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { byNumber } from '@/shared/codes';
import { daysBetween, formatDate } from '@/shared/days';
import type { FishRow } from '@/shared/fish/contract';
import { clockOf } from '@/shared/holds/clockOf';
import { clockSentence } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { dayBars } from '@/shared/holds/dayBars';

const MARGIN = 92;
const ORDER = { male: 0, female: 1, unknown: 2 };

/** Males first, then females, those that hold before those that rest; anonymous fish as one line a sex. */
export function MemberRows({ members, holds }: { members: FishRow[]; holds: HoldRow[] }) {
  const open = (id: string) => holds.find(({ holder, endedOn }) => endedOn === null && holder?.id === id);
  const coded = members
    .filter(({ code }) => code !== null)
    .toSorted(
      (a, b) =>
        ORDER[a.sex] - ORDER[b.sex] ||
        Number(b.dominant) - Number(a.dominant) ||
        Number(Boolean(open(b.id))) - Number(Boolean(open(a.id))) ||
        byNumber(a.code ?? '', b.code ?? ''),
    );
  const anonymous = (['male', 'female', 'unknown'] as const).flatMap((sex) => {
    const count = members.filter((one) => one.code === null && one.sex === sex).length;
    return count > 0 ? [{ sex, count }] : [];
  });
  const untold = holds.filter(({ holder, endedOn }) => endedOn === null && !holder?.code);
  if (members.length === 0) return <Text tone="soft">No fish in it now.</Text>;
  return (
    <Rows>
      {coded.map((fish) => (
        <MemberRow key={fish.id} fish={fish} holds={holds.filter(({ holder }) => holder?.id === fish.id)} />
      ))}
      {anonymous.map(({ sex, count }) => (
        <Row
          key={sex}
          marginWidth={MARGIN}
          margin={<Mark sex={sex} word={`${count}`} />}
          title={`${count} ${sex === 'unknown' ? 'not sexed' : sex === 'male' ? 'males' : 'females'}, not told apart`}
          middle
        />
      ))}
      {untold.map((hold) => (
        <HolderRow key={hold.id} hold={hold} />
      ))}
    </Rows>
  );
}

function Mark({ sex, word, possible = false }: { sex: FishRow['sex']; word: string; possible?: boolean }) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space[2] }}>
      <SexShape sex={sex} possible={possible} />
      <Code>{word}</Code>
    </View>
  );
}

const shortOf = (code: string): string => /(\d+)$/.exec(code)?.[1] ?? code;

function MemberRow({ fish, holds }: { fish: FishRow; holds: HoldRow[] }) {
  const room = useRoom();
  const open = holds.find(({ endedOn }) => endedOn === null);
  const clock = open ? clockOf(open.clock, open, room.today)?.clock : undefined;
  const ended = holds.flatMap(({ endedOn }) => endedOn ?? []).sort();
  const last = ended.at(-1);
  const state = open
    ? `Holding${clock ? ` day ${clock.day}` : ''}`
    : fish.dominant
      ? 'Dominant'
      : last
        ? `Resting ${daysBetween(last, room.today)} days`
        : restWords(fish);
  const code = fish.code ?? '';
  const trailing =
    fish.sex === 'female' || holds.length > 0
      ? holds.length === 0
        ? 'no holds yet'
        : `${holds.length} ${holds.length === 1 ? 'hold' : 'holds'}`
      : (fish.mark ?? undefined);
  return (
    <Row
      href={open ? `/r/${room.id}/holds/${open.id}` : `/r/${room.id}/fish/${fish.id}`}
      label={`${code}, ${fish.sex}, ${state}`}
      marginWidth={MARGIN}
      margin={<Mark sex={fish.sex} word={shortOf(code)} possible={!fish.sexCertain && fish.sex !== 'unknown'} />}
      title={<Text strong={Boolean(open) || fish.dominant}>{state}</Text>}
      {...(trailing ? { trailing } : {})}
      middle={!clock}
    >
      {clock && open ? (
        <MiniDayBars bars={dayBars(clock, { plan: open.plan })} sentence={clockSentence(clock)} width={180} />
      ) : null}
    </Row>
  );
}

/** A hold of a female that one can't tell from the others. */
function HolderRow({ hold }: { hold: HoldRow }) {
  const room = useRoom();
  const clock = clockOf(hold.clock, hold, room.today)?.clock;
  return (
    <Row
      href={`/r/${room.id}/holds/${hold.id}`}
      label={`One of the females holds, day ${clock?.day ?? '?'}`}
      marginWidth={MARGIN}
      margin={<Mark sex="female" word="?" possible />}
      title={<Text strong>{`One holds${clock ? `, day ${clock.day}` : ''}`}</Text>}
      trailing="not told apart"
    >
      {clock ? (
        <MiniDayBars bars={dayBars(clock, { plan: hold.plan })} sentence={clockSentence(clock)} width={180} />
      ) : null}
    </Row>
  );
}

function restWords({ sex, origin, arrivedOn, bornOn, keptAs }: FishRow): string {
  if (origin === 'founder' && arrivedOn) return `Came in ${formatDate(arrivedOn)}`;
  if (keptAs === 'holdback') return 'Holdback';
  if (bornOn) return `Born ${formatDate(bornOn)}`;
  return sex === 'female' ? 'Has not held yet' : 'In the colony';
}
