import { Icon } from '@/components/ui/Icon';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import type { Me } from '@/shared/accounts/contract';
import { ROLE_WORDS } from '@/shared/roles';

/** The fishrooms of an account, each a way in. */
export function RoomRows({ me, current }: { me: Me; current?: string }) {
  return (
    <Rows label="Fishrooms">
      {me.rooms.map((room) => (
        <Row
          key={room.id}
          href={`/r/${room.id}`}
          label={`${room.name}, ${ROLE_WORDS[room.role].name}${room.id === current ? ', shown now' : ''}`}
          title={room.name}
          state={ROLE_WORDS[room.role].name}
          end={room.id === current ? <Icon name="tick" size={20} width={2.4} /> : undefined}
          middle
        />
      ))}
    </Rows>
  );
}
