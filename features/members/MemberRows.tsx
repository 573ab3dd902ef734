import { useState } from 'react';
import { Icon } from '@/components/ui/Icon';
import type { MaybeAction } from '@/components/ui/Press';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, formatDay } from '@/shared/days';
import type { MemberLine } from '@/shared/members/contract';
import { ROLE_WORDS } from '@/shared/roles';
import { MemberSheet } from './MemberSheet';

type Props = { members: MemberLine[]; manages: boolean };

/** One line a member; whoever manages them opens it to change a role. */
export function MemberRows({ members, manages }: Props) {
  const [opened, setOpened] = useState<string | null>(null);
  const member = members.find(({ accountId }) => accountId === opened);
  return (
    <>
      <Rows label="Members">
        {members.map((one) => (
          <MemberRow key={one.accountId} member={one} onOpen={manages ? () => setOpened(one.accountId) : undefined} />
        ))}
      </Rows>
      {member ? <MemberSheet member={member} onClose={() => setOpened(null)} /> : null}
    </>
  );
}

function MemberRow({ member, onOpen }: { member: MemberLine; onOpen: (() => void) | undefined }) {
  const { accountId, timeZone, today } = useRoom();
  const role = ROLE_WORDS[member.role].name;
  const since = `since ${formatDay(dayOf(Date.parse(member.joinedAt), timeZone), today)}`;
  const action: MaybeAction = onOpen ? { onPress: onOpen } : {};
  const you = member.accountId === accountId ? ' (you)' : '';
  return (
    <Row
      {...action}
      label={`${member.name}${you}, ${role}`}
      title={`${member.name}${you}`}
      note={[member.email, since].filter(Boolean).join(' · ')}
      state={role}
      end={onOpen ? <Icon name="next" tone="soft" /> : undefined}
      middle
    />
  );
}
