import { useState } from 'react';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import type { Day } from '@/shared/days';
import type { Due } from '@/shared/today/due';
import { DueRow } from './DueRow';

/** A longer list than this is no list to work through with a net in the hand. */
const SHOWN = 8;

/** Holds are above with their own dates, and so are today's collections. */
const isElsewhere = ({ kind, lateDays }: Due): boolean =>
  kind === 'stripWindow' || kind === 'release' || (kind === 'collection' && lateDays === 0);

/** Head counts, samples, checks and water that are due, the latest first. */
export function DueRows({ due, today }: { due: Due[]; today: Day }) {
  const { id: roomId } = useRoom();
  const [all, setAll] = useState(false);
  const rows = due.filter((one) => !isElsewhere(one));
  const shown = all ? rows : rows.slice(0, SHOWN);
  return (
    <Section title="Due" aside={String(rows.length)}>
      {rows.length > 0 ? (
        <Rows>
          {shown.map((one) => (
            <DueRow key={one.key} due={one} today={today} margin="since" />
          ))}
        </Rows>
      ) : (
        <Text tone="soft">Nothing is due today.</Text>
      )}
      {rows.length > SHOWN && !all ? (
        <TextLink label={`Show ${rows.length - SHOWN} more`} onPress={() => setAll(true)} />
      ) : null}
      <TextLink label="All tasks, and those to come" href={`/r/${roomId}/tasks`} />
    </Section>
  );
}
