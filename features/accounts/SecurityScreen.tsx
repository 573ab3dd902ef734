import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import { EmailPart } from './EmailPart';
import { PasswordPart } from './PasswordPart';
import { useMe } from './queries';
import { SecondStepPart } from './SecondStepPart';

/** What it takes to sign in as this person. */
export function SecurityScreen() {
  const room = useRoom();
  const { account } = useMe();
  return (
    <Screen title="Address and password" back={`/r/${room.id}/settings`} measure>
      <Section title="Email" aside={account.emailVerified ? 'confirmed' : 'not confirmed'}>
        <EmailPart account={account} />
      </Section>
      <Section title="Password" aside={account.hasPassword ? undefined : 'none yet'}>
        <PasswordPart account={account} />
      </Section>
      <Section title="Second step" aside={account.secondStep ? 'on' : 'off'}>
        <SecondStepPart account={account} />
      </Section>
    </Screen>
  );
}
