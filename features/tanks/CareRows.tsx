import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { daysBetween, dayWords } from '@/shared/days';
import type { Care } from '@/shared/water/contract';

/** What runs in it: treatments and quarantine, with the day they are on. */
export function CareRows({ care }: { care: readonly Care[] }) {
  const { today } = useRoom();
  const running = care.filter(
    ({ kind, ended, untilDay, onDay }) =>
      (kind === 'treatment' || kind === 'quarantine') &&
      !ended &&
      onDay <= today &&
      (untilDay === null || untilDay >= today),
  );
  const [lastChange] = care.filter(({ kind }) => kind === 'waterChange');
  if (running.length === 0 && !lastChange) return null;
  return (
    <Section title="Care" aside={running.length > 0 ? `${running.length} running` : undefined}>
      <Rows>
        {running.map(({ id, kind, what, why, onDay, untilDay }) => (
          <Row
            key={id}
            figure={String(daysBetween(onDay, today) + 1)}
            unit="day"
            title={kind === 'quarantine' ? 'Quarantine' : (what ?? 'Treatment')}
            note={why ?? undefined}
            trailing={untilDay ? `until ${dayWords(untilDay, today)}` : 'no end set'}
          />
        ))}
        {lastChange ? (
          <Row
            figure={lastChange.percent === null ? '?' : String(Math.round(lastChange.percent))}
            unit="%"
            title="Last water change"
            note={lastChange.by}
            trailing={dayWords(lastChange.onDay, today)}
          />
        ) : null}
      </Rows>
    </Section>
  );
}
