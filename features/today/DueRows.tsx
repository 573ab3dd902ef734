import { useState } from 'react';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import type { Day } from '@/shared/days';
import type { Due } from '@/shared/today/todayOf';
import { DUE_ICONS, DUE_WORDS, dueFigure, dueNote } from './dueWords';

/** A longer list than this is no list to work through with a net in the hand. */
const SHOWN = 8;

/** Head counts, samples, checks and water that are due, the latest first. Holds are above, with their own dates. */
export function DueRows({ due, today }: { due: Due[]; today: Day }) {
  const [all, setAll] = useState(false);
  const rows = due.filter(({ kind }) => kind !== 'stripWindow' && kind !== 'release');
  if (rows.length === 0) return null;
  const shown = all ? rows : rows.slice(0, SHOWN);
  return (
    <Section title="Due" aside={String(rows.length)}>
      <Rows>
        {shown.map((one) => (
          <DueRow key={one.key} due={one} today={today} />
        ))}
      </Rows>
      {rows.length > SHOWN && !all ? (
        <TextLink label={`Show ${rows.length - SHOWN} more`} onPress={() => setAll(true)} />
      ) : null}
    </Section>
  );
}

function DueRow({ due, today }: { due: Due; today: Day }) {
  const { id: roomId } = useRoom();
  const figure = dueFigure(due, today);
  const words = due.kind === 'own' ? (due.title ?? DUE_WORDS.own) : DUE_WORDS[due.kind];
  return (
    <Row
      href={hrefOf(roomId, due)}
      label={`${words}${due.code ? `, ${due.code}` : ''}. ${dueNote(due)}`}
      figure={figure}
      unit={figure === '1' ? 'day' : 'days'}
      title={
        <Text strong>
          {words}
          {due.code ? (
            <>
              {', '}
              <Code>{due.code}</Code>
            </>
          ) : null}
        </Text>
      }
      note={dueNote(due)}
      end={<Icon name={DUE_ICONS[due.kind]} />}
    />
  );
}

/** Straight to the form that settles it, filled in. */
function hrefOf(roomId: string, { kind, id, thing }: Due) {
  const record = `/r/${roomId}/record` as const;
  switch (kind) {
    case 'holdCheck':
      return `/r/${roomId}/holds/${id}` as const;
    case 'stageCount':
      return `${record}/stage-count?batch=${id}` as const;
    case 'headCount':
      return `${record}/head-count?batch=${id}` as const;
    case 'lengthSample':
      return `${record}/length-sample?batch=${id}` as const;
    case 'waterTest':
      return `${record}/water-test?tank=${id}` as const;
    case 'waterChange':
      return `${record}/water-change?tank=${id}` as const;
    case 'own':
      return `/r/${roomId}/tasks` as const;
    default:
      return thing === 'order' ? (`/r/${roomId}/orders/${id}` as const) : (`/r/${roomId}/tanks/${id}` as const);
  }
}
