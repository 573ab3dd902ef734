import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import type { InvitationLine } from '@/shared/members/contract';
import { ROLE_WORDS } from '@/shared/roles';
import { InvitationState } from './InvitationState';
import { useMemberChanges } from './queries';

/** Invitations without an answer yet. */
export function InvitationRows({ invitations }: { invitations: InvitationLine[] }) {
  const { withdraw, sendAgain } = useMemberChanges();
  const error = withdraw.error ?? sendAgain.error;
  return (
    <>
      {error ? <Notice tone="act" alert words={error.message} /> : null}
      <Rows label="Invitations">
        {invitations.map((one) => (
          <Row
            key={one.id}
            title={one.email}
            note={<InvitationState invitation={one} />}
            state={ROLE_WORDS[one.role].name}
            action={
              <Menu
                label={`Invitation to ${one.email}`}
                items={[
                  { word: 'Send the letter again', icon: 'mail', onPress: () => sendAgain.mutate(one.id) },
                  { word: 'Withdraw the invitation', icon: 'remove', onPress: () => withdraw.mutate(one.id) },
                ]}
              />
            }
            middle
          />
        ))}
      </Rows>
    </>
  );
}
