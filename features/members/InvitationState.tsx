import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { dayOf, fromToday } from '@/shared/days';
import type { InvitationLine } from '@/shared/members/contract';

/** When it was sent, and whether its letter or its time ran out. */
export function InvitationState({ invitation }: { invitation: InvitationLine }) {
  const { timeZone, today } = useRoom();
  const day = (instant: string) => dayOf(Date.parse(instant), timeZone);
  if (invitation.letterFailed)
    return (
      <Text size="small" semi tone="trouble">
        The letter could not be delivered. Check the address.
      </Text>
    );
  const over = day(invitation.expiresAt) < today;
  return (
    <Text size="small" tone="soft">
      {over
        ? 'Too old by now. Send it again.'
        : `Sent ${fromToday(day(invitation.createdAt), today)} by ${invitation.invitedBy}`}
    </Text>
  );
}
