import { useState } from 'react';
import { Screen } from '@/components/ui/Screen';
import { Tabs } from '@/components/ui/Tabs';
import { useRoom } from '@/hooks/useRoom';
import { ChangeRows } from './ChangeRows';
import { EntryRows } from './EntryRows';

const TABS = [
  { value: 'entries', word: 'Recorded' },
  { value: 'changes', word: 'Changed and removed' },
] as const;

/** Everything that was written in the fishroom: what Record wrote, and what was changed or removed besides. */
export function TrailScreen() {
  const room = useRoom();
  const [shown, setShown] = useState<(typeof TABS)[number]['value']>('entries');
  return (
    <Screen
      title="Audit trail"
      back={`/r/${room.id}/settings`}
      fixed={<Tabs label="Part of the trail" tabs={TABS} value={shown} onChange={setShown} />}
    >
      {shown === 'entries' ? <EntryRows /> : <ChangeRows />}
    </Screen>
  );
}
