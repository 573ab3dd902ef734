import { useQuery } from '@tanstack/react-query';
import { Redirect, usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Mark } from '@/components/ui/Mark';
import { Text } from '@/components/ui/Text';
import type { Me } from '@/shared/accounts/contract';
import { DoorFrame } from './DoorFrame';
import { meQuery } from './queries';
import { RoomRows } from './RoomRows';

/** To the door, and back here afterwards. */
export function SignInFirst() {
  const next = usePathname();
  return <Redirect href={{ pathname: '/sign-in', params: { next } }} />;
}

export function StillLoading() {
  const theme = useTheme();
  return (
    <View role="main" aria-busy aria-label="Loading" style={[styles.middle, { backgroundColor: theme.ground }]}>
      <Mark width={72} />
    </View>
  );
}

/** Nothing of the page could be fetched. */
export function Trouble({ error, again }: { error: Error; again: () => void }) {
  return (
    <DoorFrame title="Not loaded" words={error.message}>
      <Button kind="primary" label="Try again" onPress={again} grow />
    </DoorFrame>
  );
}

/** For pages that need somebody signed in, and no fishroom. */
export function SignedInOnly({ children }: { children: ReactNode }) {
  const { data: me, error, refetch } = useQuery(meQuery);
  if (me === null) return <SignInFirst />;
  if (me === undefined) return error ? <Trouble error={error} again={refetch} /> : <StillLoading />;
  return children;
}

/** An address of a fishroom that this account does not belong to: whether it exists is not said. */
export function RoomMissing({ me }: { me: Me }) {
  return (
    <DoorFrame
      title="No such fishroom"
      words="The address is wrong, or you are not a member. Ask its owner for an invitation."
    >
      <RoomRows me={me} />
      <Button label="Start a fishroom" href="/new-fishroom" grow />
      <Text size="small" tone="soft">
        Signed in as {me.account.email}.
      </Text>
    </DoorFrame>
  );
}

const styles = StyleSheet.create({
  middle: { flexGrow: 1, flexShrink: 1, flexBasis: 0, alignItems: 'center', justifyContent: 'center' },
});
