import { useState } from 'react';
import { View } from 'react-native';
import { HeadBars } from '@/components/chart/HeadBars';
import { space } from '@/components/theme/space';
import { LedgerRow } from '@/components/ui/LedgerRow';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import type { BatchTold, BroodRow } from '@/shared/broods/contract';
import { headCountOf, headsOn } from '@/shared/broods/headCount';
import { stageOf } from '@/shared/broods/stage';
import { addDays, type Day, daysBetween, formatDate, formatShortDay } from '@/shared/days';
import { adultMm } from '@/shared/species/adultSize';
import { librarySpecies, profileOf } from '@/shared/species/library';
import { LINE_ICONS, lineWords } from './lineWords';
import type { BroodTold } from './queries';

type Props = {
  brood: BroodRow;
  batches: BatchTold[];
  reservations: BroodTold['reservations'];
  holdbacks: BroodTold['holdbacks'];
};

const SHOWN = 10;

/** Heads by week, and the ledger behind them: what happened, how many, what was left. */
export function HeadsPart({ brood, batches, reservations, holdbacks }: Props) {
  const room = useRoom();
  const [all, setAll] = useState(false);
  const lines = batches.flatMap((batch) =>
    headCountOf(batch.lines).rows.map((row) => ({
      row,
      tank: batch.tank?.code ?? null,
      several: batches.length > 1,
    })),
  );
  const newest = lines.sort((a, b) =>
    a.row.entry.on < b.row.entry.on
      ? 1
      : a.row.entry.on > b.row.entry.on
        ? -1
        : a.row.entry.id < b.row.entry.id
          ? 1
          : -1,
  );
  const shown = all ? newest : newest.slice(0, SHOWN);
  if (brood.opened === null) {
    return (
      <Section title="Heads">
        <Text tone="soft">The head count opens when the fry swim free.</Text>
      </Section>
    );
  }
  return (
    <Section title="Heads" aside={headsAside(brood, reservations, holdbacks.length)}>
      <View style={{ gap: space[3] }}>
        <HeadBars
          weeks={weeksOf(brood, batches, room.today)}
          sentence={`${Math.round(brood.heads)} heads of ${brood.opened}, ${brood.lost} lost.`}
        />
        <Rows>
          {shown.map(({ row, tank, several }) => (
            <LedgerRow
              key={row.entry.id}
              date={dateWords(row.entry.on, room.today)}
              icon={LINE_ICONS[row.entry.kind]}
              event={lineWords(row, several ? tank : null)}
              {...(row.change === 0 ? {} : { change: row.change })}
              loss={row.entry.kind === 'loss' || row.entry.kind === 'cull'}
              heads={row.balance}
              corrected={row.undoneBy !== null}
            />
          ))}
        </Rows>
        {newest.length > shown.length ? (
          <TextLink label={`Show ${newest.length - shown.length} more`} onPress={() => setAll(true)} />
        ) : null}
      </View>
    </Section>
  );
}

function headsAside(
  { available, reserved }: BroodRow,
  reservations: BroodTold['reservations'],
  heldBack: number,
): string {
  const kept = reservations.filter(({ kind }) => kind === 'keep').reduce((sum, { heads }) => sum + heads, 0);
  const parts = [`${Math.max(0, available)} available`];
  if (reserved - kept > 0) parts.push(`${reserved - kept} reserved`);
  if (kept > 0) parts.push(`${kept} meant to stay`);
  if (heldBack > 0) parts.push(`${heldBack} held back`);
  return parts.join(' · ');
}

const dateWords = (day: Day, today: Day): string =>
  day.slice(0, 4) === today.slice(0, 4) ? formatShortDay(day) : formatDate(day);

/** Up to 40 bars: a bar a week for the first ten months, then coarser. */
const MOST_BARS = 40;

function weeksOf(brood: BroodRow, batches: BatchTold[], today: Day) {
  const first = brood.openedOn ?? brood.startedOn;
  const days = Math.max(0, daysBetween(first, today));
  const step = Math.max(7, Math.ceil(days / MOST_BARS / 7) * 7);
  const adult = brood.speciesId && librarySpecies(brood.speciesId) ? adultMm(profileOf(brood.speciesId), null) : null;
  const count = Math.floor(days / step) + 1;
  let most = 0;
  return Array.from({ length: count }, (_, i) => {
    const day = i === count - 1 ? today : addDays(first, (i + 1) * step - 1);
    const heads = Math.round(
      batches.reduce(
        (sum, { lines, sources }) =>
          sum + headsOn(lines, day) * (sources.find(({ broodId }) => broodId === brood.id)?.share ?? 0),
        0,
      ),
    );
    most = Math.max(most, heads);
    const isNow = i === count - 1;
    const stage = stageOf({
      spawnLatest: brood.spawnLatest,
      openedOn: brood.openedOn,
      meanMm: isNow && brood.lastSample ? brood.lastSample.meanTenthsMm / 10 : null,
      adultMm: adult,
      today: day,
    });
    return { day, heads, gone: most - heads, stage };
  });
}
