import { useIsMutating, useQuery } from '@tanstack/react-query';
import { usePathname, useRouter } from 'expo-router';
import { type ReactNode, useEffect, useState } from 'react';
import { PlacesShell } from '@/components/ui/PlacesShell';
import type { SavedState } from '@/components/ui/SavedLine';
import { LastTold } from '@/features/entries/LastTold';
import { ToldStrip } from '@/features/entries/ToldStrip';
import { useClock } from '@/hooks/useClock';
import { useHotkey } from '@/hooks/useHotkey';
import { useOnline } from '@/hooks/useOnline';
import { type Room, RoomProvider, useRoom } from '@/hooks/useRoom';
import type { Me } from '@/shared/accounts/contract';
import { may, ROLE_WORDS } from '@/shared/roles';
import { RoomMissing, SignInFirst, StillLoading, Trouble } from './gates';
import { rememberRoom } from './lastRoom';
import { placeOf, placesOf } from './places';
import { meQuery } from './queries';

/** The Record sheet; another feature's, set in by the layout. */
type RecordSheetOf = (open: boolean, close: () => void) => ReactNode;

type Props = { roomId: string; recordSheet: RecordSheetOf; children: ReactNode };

/** The gate and the frame of one fishroom: who is signed in, as what, and where they are. */
export function RoomShell({ roomId, recordSheet, children }: Props) {
  const { data: me, error, refetch } = useQuery(meQuery);
  if (me === null) return <SignInFirst />;
  if (me === undefined) return error ? <Trouble error={error} again={refetch} /> : <StillLoading />;
  const room = roomOf(me, roomId);
  if (!room) return <RoomMissing me={me} />;
  return (
    <RoomProvider room={room}>
      <LastTold>
        <Frame recordSheet={recordSheet}>{children}</Frame>
      </LastTold>
    </RoomProvider>
  );
}

function roomOf({ account, rooms }: Me, roomId: string): Room | null {
  const room = rooms.find(({ id }) => id === roomId);
  if (!room) return null;
  return { ...room, units: account.choices.units ?? room.units, accountId: account.id, accountName: account.name };
}

function Frame({ recordSheet, children }: Omit<Props, 'roomId'>) {
  const room = useRoom();
  const router = useRouter();
  const { place, sub, bare } = placeOf(usePathname());
  const [recording, setRecording] = useState(false);
  const time = useClock(room.timeZone);
  const saved = useSaved();
  useEffect(() => rememberRoom(room.id), [room.id]);
  useHotkey('/', () => toSearch(() => router.push(`/r/${room.id}/stock`)));
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
  const saving = useIsMutating() > 0;
  if (!online) return { kind: 'offline', count: 0 };
  return { kind: saving ? 'saving' : 'saved' };
}

/** To the page's own search field; Stock has one for everything. */
function toSearch(elsewhere: () => void): void {
  const field = document.querySelector<HTMLElement>('input[type=search]');
  if (field) field.focus();
  else elsewhere();
}
