import { useIsMutating, useQuery } from '@tanstack/react-query';
import { usePathname, useRouter } from 'expo-router';
import { type ReactNode, useEffect, useState } from 'react';
import { useIsWide } from '@/components/theme/breakpoint';
import { PlacesShell } from '@/components/ui/PlacesShell';
import type { SavedState } from '@/components/ui/SavedLine';
import { useQueue } from '@/features/entries';
import { LastTold } from '@/features/entries/LastTold';
import { ToldStrip } from '@/features/entries/ToldStrip';
import { useClock } from '@/hooks/useClock';
import { useHotkey } from '@/hooks/useHotkey';
import { useOnline } from '@/hooks/useOnline';
import { type Room, RoomProvider, useRoom } from '@/hooks/useRoom';
import type { Me } from '@/shared/accounts/contract';
import { dayOf } from '@/shared/days';
import { may, ROLE_WORDS } from '@/shared/roles';
import { RoomMissing, SignInFirst, StillLoading, Trouble } from './gates';
import { rememberRoom } from './lastRoom';
import { placeOf, placesOf } from './places';
import { meQuery } from './queries';

/** The Record sheet; another feature's, set in by the layout. */
type RecordSheetOf = (open: boolean, close: () => void) => ReactNode;

type Props = {
  roomId: string;
  recordSheet: RecordSheetOf;
  /** What waits on this device, under a phone's strip; another feature's, set in by the layout. */
  waiting: ReactNode;
  children: ReactNode;
};

/** The gate and the frame of one fishroom: who is signed in, as what, and where they are. */
export function RoomShell({ roomId, children, ...slots }: Props) {
  const { data: me, error, refetch, dataUpdatedAt } = useQuery(meQuery);
  if (me === null) return <SignInFirst />;
  if (me === undefined) return error ? <Trouble error={error} again={refetch} /> : <StillLoading />;
  const room = roomOf(me, roomId, dataUpdatedAt);
  if (!room) return <RoomMissing me={me} />;
  return (
    <RoomProvider room={room}>
      <LastTold>
        <Frame {...slots}>{children}</Frame>
      </LastTold>
    </RoomProvider>
  );
}

/** Asked so long ago, the day is this device's: without a signal midnight comes all the same. */
const DAY_TOLD_MS = 15 * 60_000;

function roomOf({ account, rooms }: Me, roomId: string, askedAt: number): Room | null {
  const room = rooms.find(({ id }) => id === roomId);
  if (!room) return null;
  const now = Date.now();
  const today = now - askedAt > DAY_TOLD_MS ? dayOf(now, room.timeZone) : room.today;
  const units = account.choices.units ?? room.units;
  return { ...room, today, units, accountId: account.id, accountName: account.name };
}

function Frame({ recordSheet, waiting, children }: Omit<Props, 'roomId'>) {
  const room = useRoom();
  const router = useRouter();
  const { place, sub, bare } = placeOf(usePathname());
  const [recording, setRecording] = useState(false);
  const time = useClock(room.timeZone);
  const saved = useSaved();
  const wide = useIsWide();
  const [showWaiting, setShowWaiting] = useState(false);
  const counted = 'count' in saved && saved.count > 0;
  // A phone shows them over the page one is on; a wide screen has a page for them.
  const onSaved = wide ? () => router.push(`/r/${room.id}/waiting`) : () => setShowWaiting(!showWaiting);
  useEffect(() => rememberRoom(room.id), [room.id]);
  useHotkey('/', () => toSearch(() => router.push(`/r/${room.id}/search`)));
  const mayRecord = may(room.role, 'entry:record');
  return (
    <PlacesShell
      places={placesOf(room.id, room.role)}
      current={place}
      currentSub={sub}
      onRecord={mayRecord ? () => setRecording(true) : undefined}
      bare={bare}
      over={
        <>
          <ToldStrip />
          {recordSheet(recording, () => setRecording(false))}
        </>
      }
      saved={saved}
      {...(counted ? { onSaved, savedOpen: showWaiting } : {})}
      under={counted && showWaiting && !wide && !bare && sub !== 'waiting' ? waiting : null}
      person={`${room.accountName}, ${ROLE_WORDS[room.role].name.toLowerCase()}`}
      onPerson={() => router.push(`/r/${room.id}/settings`)}
      place={`${room.name} · ${time}`}
    >
      {children}
    </PlacesShell>
  );
}

function useSaved(): SavedState {
  const online = useOnline();
  const { entries, sendingId, noSignal } = useQueue();
  const saving = useIsMutating() > 0 || sendingId !== null;
  const refused = entries.filter(({ trouble }) => trouble !== null).length;
  const count = entries.length;
  if (!online || noSignal) return { kind: 'offline', count };
  if (refused > 0) return { kind: 'refused', count: refused };
  if (saving) return { kind: 'saving' };
  return count > 0 ? { kind: 'waiting', count } : { kind: 'saved' };
}

/** To the page's own search field; else to the search over everything. */
function toSearch(elsewhere: () => void): void {
  const field = document.querySelector<HTMLElement>('input[type=search]');
  if (field) field.focus();
  else elsewhere();
}
