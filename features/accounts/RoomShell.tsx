import { useIsMutating, useQuery } from '@tanstack/react-query';
import { usePathname, useRouter } from 'expo-router';
import { type ReactNode, useEffect } from 'react';
import { PlacesShell } from '@/components/ui/PlacesShell';
import type { SavedState } from '@/components/ui/SavedLine';
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

/** The gate and the frame of one fishroom: who is signed in, as what, and where they are. */
export function RoomShell({ roomId, children }: { roomId: string; children: ReactNode }) {
  const { data: me, error, refetch } = useQuery(meQuery);
  if (me === null) return <SignInFirst />;
  if (me === undefined) return error ? <Trouble error={error} again={refetch} /> : <StillLoading />;
  const room = roomOf(me, roomId);
  if (!room) return <RoomMissing me={me} />;
  return (
    <RoomProvider room={room}>
      <Frame>{children}</Frame>
    </RoomProvider>
  );
}

function roomOf({ account, rooms }: Me, roomId: string): Room | null {
  const room = rooms.find(({ id }) => id === roomId);
  if (!room) return null;
  return { ...room, units: account.choices.units ?? room.units, accountId: account.id, accountName: account.name };
}

function Frame({ children }: { children: ReactNode }) {
  const room = useRoom();
  const router = useRouter();
  const { place, sub } = placeOf(usePathname());
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
      onRecord={mayRecord ? () => router.push(`/r/${room.id}/record`) : undefined}
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
