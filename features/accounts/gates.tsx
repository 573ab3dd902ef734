import { useQuery } from '@tanstack/react-query';
import { Redirect, usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Mark } from '@/components/ui/Mark';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import type { Me } from '@/shared/accounts/contract';
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
    <Screen title="Not loaded" measure>
      <Text style={{ marginBottom: space[5] }}>{error.message}</Text>
      <Button kind="primary" label="Try again" onPress={again} />
    </Screen>
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
    <Screen title="No such fishroom" subtitle={`Signed in as ${me.account.email}`} measure>
      <Text tone="soft" style={{ marginBottom: space[5] }}>
        The address is wrong, or you are not a member. Ask its owner for an invitation.
      </Text>
      <RoomRows me={me} />
      <Button label="Start a fishroom" href="/new-fishroom" />
    </Screen>
  );
}

const styles = StyleSheet.create({
  middle: { flexGrow: 1, flexShrink: 1, flexBasis: 0, alignItems: 'center', justifyContent: 'center' },
});
