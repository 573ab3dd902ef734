import { usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { TwoPane } from '@/components/ui/TwoPane';
import { SettingsList } from './SettingsList';
import { YouScreen } from './YouScreen';

/** The list of settings, and beside it the page that was chosen. */
export function SettingsPanes({ children }: { children: ReactNode }) {
  const [, , , , page] = usePathname().split('/');
  return <TwoPane list={<SettingsList />} detail={page ? children : null} nothing={<YouScreen />} />;
}
