import { Slot } from 'expo-router';
import { AppRoot } from '@/features/accounts/AppRoot';
import { AppUpdate } from '@/features/queue/AppUpdate';

export default function RootLayout() {
  return (
    <AppRoot>
      <AppUpdate />
      <Slot />
    </AppRoot>
  );
}
