import { Slot } from 'expo-router';
import { SettingsPanes } from '@/features/accounts/SettingsPanes';

export default function SettingsLayout() {
  return (
    <SettingsPanes>
      <Slot />
    </SettingsPanes>
  );
}
