import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { call } from '@/features/call';
import type { Me } from '@/shared/accounts/contract';
import { acceptInvitation, declineInvitation } from '@/shared/members/contract';
import { ROLE_WORDS } from '@/shared/roles';
import { useAskAgain } from './queries';

/** Invitations to one's own address that wait for a yes or no. */
export function OpenInvitations({ me }: { me: Me }) {
  return me.invitations.map((one) => <OpenInvitation key={one.id} invitation={one} />);
}

function OpenInvitation({ invitation }: { invitation: Me['invitations'][number] }) {
  const { id, roomName, role, invitedBy } = invitation;
  const router = useRouter();
  const askAgain = useAskAgain();
  const params = { invitationId: id };
  const accept = useMutation({
    mutationFn: () => call(acceptInvitation, { params }),
    onSuccess: async ({ roomId }) => {
      await askAgain();
      router.push(`/r/${roomId}`);
    },
  });
  const decline = useMutation({ mutationFn: () => call(declineInvitation, { params }), onSuccess: askAgain });
  const error = accept.error ?? decline.error;
  return (
    <Notice
      title={`${invitedBy} invites you to ${roomName}`}
      words={error ? error.message : `As ${ROLE_WORDS[role].name.toLowerCase()}. ${ROLE_WORDS[role].says}`}
    >
      <Button
        kind="primary"
        small
        label="Join"
        busy={accept.isPending}
        busyLabel="Joining"
        onPress={() => accept.mutate()}
      />
      <Button small label="Decline" busy={decline.isPending} busyLabel="Declining" onPress={() => decline.mutate()} />
    </Notice>
  );
}
