import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { addDays, dayOf, fromToday } from '@/shared/days';
import { may } from '@/shared/roles';
import type { Settled } from '@/shared/today/decided';
import { dueTitle } from '@/shared/today/dueWords';
import { DueTitle } from './DueRow';
import { useDecide } from './useSettle';

const SHOWN_DAYS = 7;
const SHOWN = 20;

/** What was done or skipped in the last days, by whom and why; any of it can be brought back. */
export function SettledRows({ settled }: { settled: Settled[] }) {
  const room = useRoom();
  const decide = useDecide();
  const dayDone = ({ decision }: Settled) => dayOf(Date.parse(decision.doneAt), room.timeZone);
  const shown = settled.filter((one) => dayDone(one) > addDays(room.today, -SHOWN_DAYS)).slice(0, SHOWN);
  if (shown.length === 0) return null;
  const back = (taskKey: string) =>
    decide.mutate({ taskKey, decision: 'open', because: null, until: null, assignedTo: null });
  return (
    <Section title="Done and skipped" aside="last 7 days">
      {decide.error ? <Notice tone="act" alert words={decide.error.message} /> : null}
      <Rows label="Done and skipped">
        {shown.map((one) => (
          <Row
            key={one.key}
            title={<DueTitle words={dueTitle(one)} code={one.code} />}
            note={settledNote(one, fromToday(dayDone(one), room.today))}
            action={
              may(room.role, 'task:write') ? (
                <Button
                  kind="text"
                  small
                  label="Bring back"
                  describe={`Bring back: ${[dueTitle(one), one.code].filter(Boolean).join(', ')}`}
                  onPress={() => back(one.key)}
                />
              ) : undefined
            }
          />
        ))}
      </Rows>
    </Section>
  );
}

function settledNote({ decision: { skippedBecause, doneBy } }: Settled, when: string): string {
  const who = doneBy ? ` by ${doneBy}` : '';
  return skippedBecause ? `Skipped ${when}${who}: ${skippedBecause}` : `Done ${when}${who}`;
}
