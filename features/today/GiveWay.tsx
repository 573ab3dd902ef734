import { useQuery } from '@tanstack/react-query';
import { Icon } from '@/components/ui/Icon';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { useRoom } from '@/hooks/useRoom';
import { ROLE_WORDS } from '@/shared/roles';
import type { Due } from '@/shared/today/due';
import { membersQuery } from './queries';
import type { Decision } from './useSettle';

type Props = { due: Due; save: (decision: Decision) => Promise<void> };

/** Whose it is: one tap on a name. */
export function GiveWay({ due, save }: Props) {
  const room = useRoom();
  const { data: members, error } = useQuery(membersQuery(room.id));
  if (!members)
    return error ? <Notice tone="act" words={error.message} /> : <Loading label="Loading members" rows={2} />;
  const people = [
    { id: null, word: 'Nobody', note: 'Whoever comes by' },
    ...members.map(({ accountId, name, role }) => ({
      id: accountId,
      word: accountId === room.accountId ? `${name} (you)` : name,
      note: ROLE_WORDS[role].name,
    })),
  ];
  const chosen = due.assignedTo?.id ?? null;
  return (
    <Rows label="Give to">
      {people.map(({ id, word, note }) => (
        <Row
          key={id ?? 'nobody'}
          onPress={() => void save({ decision: 'assign', assignedTo: id })}
          label={`Give to ${word}${id === chosen ? ', whose it is now' : ''}`}
          title={word}
          note={note}
          end={id === chosen ? <Icon name="tick" /> : undefined}
          middle
        />
      ))}
    </Rows>
  );
}
