import { Redirect, usePathname } from 'expo-router';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { Mark } from '@/components/ui/Mark';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import type { Me } from '@/shared/accounts/contract';
import { ROLE_WORDS } from '@/shared/roles';

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

/** The fishrooms of an account, each a way in. */
export function RoomRows({ me, current }: { me: Me; current?: string }) {
  return (
    <Rows label="Fishrooms">
      {me.rooms.map((room) => (
        <Row
          key={room.id}
          href={`/r/${room.id}`}
          label={`${room.name}, ${ROLE_WORDS[room.role].name}`}
          title={room.name}
          trailing={ROLE_WORDS[room.role].name}
          selected={room.id === current}
        />
      ))}
    </Rows>
  );
}

const styles = StyleSheet.create({
  middle: { flexGrow: 1, flexShrink: 1, flexBasis: 0, alignItems: 'center', justifyContent: 'center' },
});
