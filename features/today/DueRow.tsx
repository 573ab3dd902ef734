import { useRef } from 'react';
import { View } from 'react-native';
import { Code } from '@/components/ui/Code';
import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { type Day, formatShortDay } from '@/shared/days';
import { may } from '@/shared/roles';
import type { Due } from '@/shared/today/due';
import { dueNote, dueTitle } from '@/shared/today/dueWords';
import { DUE_ICONS, dueFigure, dueHref } from './dueLooks';
import { TaskButton } from './TaskButton';

type Props = {
  due: Due;
  today: Day;
  /** What stands in the margin: days since the last one, or the day on which it is due. */
  margin: 'since' | 'day';
};

/** One thing that is due: to its form by the row, to done, skip and put off by the button at its end. */
export function DueRow({ due, today, margin }: Props) {
  const room = useRoom();
  const row = useRef<View>(null);
  const words = dueTitle(due);
  const note = dueNote(due);
  const given = due.assignedTo?.name;
  return (
    <View ref={row}>
      <Row
        href={dueHref(room, due)}
        label={[`${words}${due.code ? `, ${due.code}` : ''}. ${note}`, given].filter(Boolean).join(' ')}
        {...marginOf(due, today, margin)}
        title={<DueTitle words={words} code={due.code} />}
        note={given ? `${note} ${given}.` : note}
        end={<Icon name={DUE_ICONS[due.kind]} />}
        action={may(room.role, 'task:write') ? <TaskButton due={due} anchor={row} /> : undefined}
      />
    </View>
  );
}

function marginOf(due: Due, today: Day, margin: Props['margin']) {
  if (margin === 'day') {
    const [figure = '', unit = ''] = formatShortDay(due.dueOn).split(' ');
    return { figure, unit };
  }
  const figure = dueFigure(due, today);
  return { figure, unit: figure === '1' ? 'day' : 'days' };
}

export const DueTitle = ({ words, code }: { words: string; code: string }) => (
  <Text strong>
    {words}
    {code ? (
      <>
        {', '}
        <Code>{code}</Code>
      </>
    ) : null}
  </Text>
);
