import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import { InvitationRows } from './InvitationRows';
import { InviteSheet } from './InviteSheet';
import { LeaveButton } from './LeaveButton';
import { MemberRows } from './MemberRows';
import { membersQuery } from './queries';
import { RoleTable } from './RoleTable';

/** Who belongs to the fishroom, as what, and who is invited. */
export function MembersScreen() {
  const room = useRoom();
  const [inviting, setInviting] = useState(false);
  const { data, error, refetch } = useQuery(membersQuery(room.id));
  const manages = may(room.role, 'member:manage');
  return (
    <Screen
      title="Members"
      back={`/r/${room.id}/settings`}
      measure
      dock={
        manages ? <Button kind="primary" label="Invite a member" onPress={() => setInviting(true)} grow /> : undefined
      }
    >
      {error ? <ErrorState title="Not loaded" words={error.message} onRetry={refetch} /> : null}
      {data ? (
        <>
          <Section title="Members" aside={String(data.members.length)}>
            <MemberRows members={data.members} manages={manages} />
          </Section>
          {data.invitations.length > 0 ? (
            <Section title="Invited" aside={String(data.invitations.length)}>
              <InvitationRows invitations={data.invitations} />
            </Section>
          ) : null}
        </>
      ) : error ? null : (
        <Loading label="Loading members" rows={3} />
      )}
      <Section title="What each role may do">
        <RoleTable />
      </Section>
      <LeaveButton />
      <InviteSheet open={inviting} onClose={() => setInviting(false)} />
    </Screen>
  );
}
