import { View } from 'react-native';
import { DateField } from '@/components/form/DateField';
import { NumberField } from '@/components/form/NumberField';
import { SegmentedField } from '@/components/form/SegmentedField';
import { SelectField } from '@/components/form/Select';
import { TextField } from '@/components/form/TextField';
import { space } from '@/components/theme/space';
import { Caution } from '@/components/ui/Caution';
import { Text } from '@/components/ui/Text';
import { Beside } from '@/features/entries/Beside';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { residentsWords } from '@/features/entries/tanks';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { clockOf } from '@/shared/holds/clockOf';
import { STRIP_CAUTION } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { EndDraft, endingOf, FOUND, FOUND_WORDS, type Found, startOf } from './ending';
import { HoldLine } from './HoldLine';
import { modeWords } from './modeWords';
import { useEndClash } from './useEndClash';

type Props = {
  hold: HoldRow;
  outcome: 'stripped' | 'released';
  tanks: readonly TankRow[];
  proposedCode: string;
  proposedTankId: string | null;
};

/** One total with the female in hand; the split, dead and deformed now or later. */
export function EndFields({ hold, outcome, tanks, proposedCode, proposedTankId }: Props) {
  const room = useRoom();
  const words = modeWords(hold.mode);
  const title = words.ends[outcome];
  const entry = useEntryForm({
    title,
    draft: `${outcome}:${hold.id}`,
    schema: EndDraft,
    start: startOf(room.today, foundNow(hold, room.today), proposedTankId, proposedCode),
    content: (value, idOf) => endingOf(value, hold.id, outcome, idOf),
    saved: ({ line }) => (line?.made['brood'] ? `/r/${room.id}/broods/${line.made['brood']}` : null),
    clashes: true,
  });
  const { found } = entry.form.values;
  const clash = useEndClash(entry, () => EndDraft.safeParse(blanked(entry.form.values)).data ?? null);
  return (
    <EntryPage
      entry={entry}
      subtitle={<HoldLine hold={hold} />}
      saveLabel={`Save ${title.toLowerCase()}`}
      clash={clash}
    >
      {outcome === 'stripped' ? <Caution words={STRIP_CAUTION} /> : null}
      <Part title="How many?" aside="empty if not counted">
        <View style={{ gap: space[4] }}>
          <NumberField name="total" label="In all, alive" unit={unitOf(found)} whole />
          <SegmentedField
            name="found"
            label="They are"
            choices={FOUND.map((value) => ({ value, word: FOUND_WORDS[value] }))}
          />
          {found === 'mixed' ? <Split /> : null}
          <Beside>
            <NumberField name="dead" label="Dead" whole />
            <NumberField name="deformed" label="Deformed" whole />
          </Beside>
          <Text size="small" tone="soft">
            {found === 'freeSwimming'
              ? 'The head count opens with this number, and survival is reckoned from it.'
              : 'The head count opens when they swim free. The split can wait: record it on the brood’s page.'}
          </Text>
        </View>
      </Part>
      <Part title="The brood">
        <View style={{ gap: space[4] }}>
          <SelectField
            name="tankId"
            label={outcome === 'stripped' ? 'Into which tank' : 'In which tank they are'}
            options={tanks.map((tank) => ({ value: tank.id, code: tank.code, word: residentsWords(tank) }))}
          />
          <TextField name="code" label="Code" mono autoCapitalize="characters" />
          <DateField
            name="onDay"
            label={outcome === 'stripped' ? 'Stripped on' : `${title} on`}
            today={room.today}
            earliest={hold.spawnEarliest}
            hint={`Recorded by ${room.accountName}`}
          />
          <TextField name="note" label="Note" aside="not needed" long />
        </View>
      </Part>
    </EntryPage>
  );
}

function Split() {
  return (
    <Beside>
      <NumberField name="eggs" label="Eggs" whole />
      <NumberField name="wrigglers" label="Wrigglers" whole />
      <NumberField name="freeSwimming" label="Swimming" whole />
    </Beside>
  );
}

/** What she would have in her mouth by the clock. */
function foundNow(hold: HoldRow, today: string): Found {
  const stage = clockOf(hold.clock, hold, today)?.clock.stage;
  return stage === 'egg' ? 'eggs' : stage === 'wriggler' ? 'wrigglers' : 'freeSwimming';
}

const unitOf = (found: Found): string =>
  found === 'eggs' ? 'eggs' : found === 'wrigglers' ? 'wrigglers' : found === 'mixed' ? 'in all' : 'fry';

/** As Formik hands a draft to its schema: what is empty is left out. */
const blanked = <Draft extends object>(draft: Draft) =>
  Object.fromEntries(Object.entries(draft).map(([key, value]) => [key, value === '' ? undefined : value]));
