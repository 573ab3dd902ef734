import { useFormikContext } from 'formik';
import { DateField } from '@/components/form/DateField';
import { Part } from '@/features/entries/Part';
import { useRoom } from '@/hooks/useRoom';
import { addDays, type Day, daysBetween, isDay } from '@/shared/days';
import type { BeginDraft } from './beginning';
import { lastLookedChoices } from './lastLooked';
import type { ModeWords } from './modeWords';

type HoldingProps = { words: ModeWords; lookedOn: Day | null; lastEndedOn: Day | null; longest: number };

/** Between which days she spawned: last seen not holding, first seen holding. */
export function HoldingDays({ words, lookedOn, lastEndedOn, longest }: HoldingProps) {
  const { today } = useRoom();
  const { values } = useFormikContext<BeginDraft>();
  const firstSeenOn = isDay(values.firstSeenOn) ? values.firstSeenOn : today;
  const choices = lastLookedChoices({ firstSeenOn, today, lookedOn, lastEndedOn, longest });
  const back = values.notYetOn && isDay(values.notYetOn) ? daysBetween(values.notYetOn, firstSeenOn) : 0;
  return (
    <>
      <Part title={words.notYet} aside="spawn not seen">
        <DateField
          name="notYetOn"
          label={words.notYet}
          quiet
          today={today}
          latest={firstSeenOn}
          choices={choices}
          {...(back > 14 ? { hint: `The spawn may be up to ${back} days back: the dates below are wide.` } : {})}
        />
      </Part>
      <Part title={words.first}>
        <DateField name="firstSeenOn" label={words.first} quiet today={today} />
      </Part>
    </>
  );
}

/** The spawn was watched: one day. */
export function SpawnDay() {
  const { today } = useRoom();
  return (
    <Part title="Spawned on">
      <DateField
        name="firstSeenOn"
        label="Spawned on"
        quiet
        today={today}
        choices={[
          { word: 'Today', day: today },
          { word: 'Yesterday', day: addDays(today, -1) },
        ]}
      />
    </Part>
  );
}
