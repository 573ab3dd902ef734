import { usePathname } from 'expo-router';
import { View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { useThemeChoice } from '@/components/theme/ThemeProvider';
import { Button } from '@/components/ui/Button';
import { LinkRow } from '@/components/ui/LinkRow';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import { OpenInvitations } from './OpenInvitations';
import { useMe } from './queries';
import { RoomRows } from './RoomRows';
import { SignOutButton } from './SignOutButton';
import { roomPages, yourPages } from './settingsPages';

/** The account menu: the fishrooms one belongs to, what can be set in this one, oneself, and the way out. */
export function SettingsList() {
  const room = useRoom();
  const me = useMe();
  const beside = useBreakpoint() === 'full';
  const here = usePathname().split('/')[4];
  const rows = (pages: readonly { name: string; word: string; note: string }[]) =>
    pages.map(({ name, word, note }) => (
      <LinkRow
        key={name}
        title={word}
        note={note}
        href={`/r/${room.id}/settings/${name}`}
        selected={beside && name === here}
      />
    ));
  return (
    <Screen title="Settings" subtitle={`${me.account.name}, ${me.account.email}`}>
      <OpenInvitations me={me} />
      <Section title="Fishrooms" aside={me.rooms.length > 1 ? 'Switch by choosing one' : undefined}>
        <RoomRows me={me} current={room.id} />
        <View style={{ marginTop: space[3] }}>
          <Button label="Start another fishroom" small href="/new-fishroom" />
        </View>
      </Section>
      <Section title={room.name}>
        <Rows bleed>{rows(roomPages.filter(({ needs }) => may(room.role, needs)))}</Rows>
      </Section>
      <Section title="You">
        <Rows bleed>{rows(yourPages)}</Rows>
      </Section>
      {beside ? null : <ThemeSection />}
      <SignOutButton />
    </Screen>
  );
}

/** The full rail has it. */
function ThemeSection() {
  const { name, choose } = useThemeChoice();
  return (
    <Section title="Light of this device">
      <Segmented
        label="Theme"
        value={name}
        onChange={choose}
        choices={[
          { value: 'dark', word: 'Dim room' },
          { value: 'light', word: 'Daylight' },
        ]}
      />
    </Section>
  );
}
