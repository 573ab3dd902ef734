import { createContext, type ReactNode, use } from 'react';
import type { Role } from '@/shared/roles';
import type { UnitChoices } from '@/shared/units';

/** The fishroom that the address names, and the person in it. */
export type Room = {
  id: string;
  name: string;
  slug: string;
  role: Role;
  timeZone: string;
  currency: string;
  /** The fishroom's calendar day. */
  today: string;
  units: UnitChoices;
  accountId: string;
  accountName: string;
};

const RoomContext = createContext<Room | null>(null);

export function RoomProvider({ room, children }: { room: Room; children: ReactNode }) {
  return <RoomContext value={room}>{children}</RoomContext>;
}

/** Only under /r/[roomId]. */
export function useRoom(): Room {
  const room = use(RoomContext);
  if (!room) throw new Error('useRoom outside of a fishroom');
  return room;
}
