import { useMutation, useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { Button } from '@/components/ui/Button';
import { KeyValues } from '@/components/ui/KeyValues';
import { Notice } from '@/components/ui/Notice';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { call } from '@/features/call';
import { joinByLink, readInvitation } from '@/shared/members/contract';
import { ROLE_WORDS } from '@/shared/roles';
import { DoorFrame } from './DoorFrame';
import { StillLoading } from './gates';
import { meQuery, useAskAgain, useSignOut } from './queries';

/** Behind an invitation's link: which fishroom, as what, by whom; then a button. */
export function JoinScreen({ token }: { token: string }) {
  const me = useQuery(meQuery);
  const invitation = useQuery({
    queryKey: ['invitation', token],
    queryFn: ({ signal }) => call(readInvitation, { params: { token }, signal }),
  });
  if (invitation.error) {
    return (
      <DoorFrame title="No invitation here" words={invitation.error.message}>
        <Button kind="primary" label="To Kinwater" href="/" grow />
      </DoorFrame>
    );
  }
  if (!invitation.data || me.data === undefined) return <StillLoading />;
  const { roomName, role, invitedBy, email, hasAccount } = invitation.data;
  return (
    <DoorFrame title={roomName} words={`${invitedBy} invites you to this fishroom.`}>
      <KeyValues
        pairs={[
          { key: 'Your role', value: ROLE_WORDS[role].name, note: ROLE_WORDS[role].says },
          { key: 'Sent to', value: email },
        ]}
      />
      {me.data === null ? (
        <Outside token={token} email={email} hasAccount={hasAccount} />
      ) : (
        <Inside token={token} signedInAs={me.data.account.email} sentTo={email} roomName={roomName} />
      )}
    </DoorFrame>
  );
}

function Outside({ token, email, hasAccount }: { token: string; email: string; hasAccount: boolean }) {
  const next = `/join/${token}`;
  const signUp = { pathname: '/sign-up', params: { next, invitation: token, email } } as const;
  const signIn = { pathname: '/sign-in', params: { next } } as const;
  return hasAccount ? (
    <>
      <Button kind="primary" label="Sign in to join" href={signIn} grow />
      <TextLink label="Sign up with another address" href={{ pathname: '/sign-up', params: { next } }} />
    </>
  ) : (
    <>
      <Button kind="primary" label="Sign up to join" href={signUp} grow />
      <TextLink label="I have an account: sign in" href={signIn} />
    </>
  );
}

type InsideProps = { token: string; signedInAs: string; sentTo: string; roomName: string };

function Inside({ token, signedInAs, sentTo, roomName }: InsideProps) {
  const router = useRouter();
  const askAgain = useAskAgain();
  const signOut = useSignOut();
  const join = useMutation({
    mutationFn: () => call(joinByLink, { params: { token } }),
    onSuccess: async ({ roomId }) => {
      await askAgain();
      router.replace(`/r/${roomId}`);
    },
  });
  return (
    <>
      {signedInAs.toLowerCase() === sentTo ? null : (
        <Text size="small" tone="soft">
          You are signed in as {signedInAs}, and join as that.
        </Text>
      )}
      {join.error ? <Notice tone="act" alert words={join.error.message} /> : null}
      <Button
        kind="primary"
        label={`Join ${roomName}`}
        busyLabel="Joining"
        busy={join.isPending}
        onPress={() => join.mutate()}
        grow
      />
      <TextLink label="Use another account" onPress={() => signOut.mutate()} />
    </>
  );
}
