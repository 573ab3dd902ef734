import { useMutation } from '@tanstack/react-query';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Part } from '@/features/entries/Part';
import { useRoom } from '@/hooks/useRoom';
import { daysBetween, dayWords } from '@/shared/days';
import type { EntryContent } from '@/shared/record/kinds';
import type { TankWater } from './queries';

type Props = { care: TankWater['care']; end: (content: EntryContent) => Promise<void> };

/** What runs in the tank now, each to be ended today. */
export function RunningCare({ care, end }: Props) {
  const { today } = useRoom();
  const ending = useMutation({ mutationFn: end });
  const running = care.filter(({ ended, untilDay }) => !ended && (untilDay === null || untilDay >= today));
  if (running.length === 0) return null;
  return (
    <Part title="Running now" aside={String(running.length)}>
      <Rows>
        {running.map(({ id, kind, what, why, onDay, untilDay }) => {
          const name = kind === 'quarantine' ? 'Quarantine' : (what ?? 'Treatment');
          return (
            <Row
              key={id}
              figure={String(daysBetween(onDay, today) + 1)}
              unit="day"
              title={name}
              note={[why, untilDay ? `until ${dayWords(untilDay, today)}` : 'no end set'].filter(Boolean).join(', ')}
              action={
                <Button
                  label="End today"
                  describe={`End ${name} today`}
                  small
                  busy={ending.isPending}
                  onPress={() => ending.mutate({ kind: 'treatmentEnded', careId: id, onDay: today, note: null })}
                />
              }
            />
          );
        })}
      </Rows>
      {ending.error ? <Notice tone="act" alert words={ending.error.message} /> : null}
    </Part>
  );
}
