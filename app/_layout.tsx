import { Slot } from 'expo-router';
import { AppRoot } from '@/features/accounts/AppRoot';

export default function RootLayout() {
  return (
    <AppRoot>
      <Slot />
    </AppRoot>
  );
}
