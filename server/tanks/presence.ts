import { sql } from 'kysely';
import type { Scope } from '../scope';

/** A fish in a tank over an interval; `untilDay` null: still there. */
export type Presence = { fishId: string; fromDay: string; untilDay: string | null };

/**
 * Which fish were in a tank on any day of an interval, by a stay of their own or by their colony's. A fish that moved on its
 * own while a member of the colony is where it moved to. The day of a move counts for both tanks.
 */
export async function presenceIn(
  { db, roomId }: Scope,
  tankId: string,
  from: string,
  until: string,
): Promise<Presence[]> {
  const { rows } = await sql<Presence>`
    select stay.fishId, stay.fromDay, stay.untilDay
      from stay
     where stay.roomId = ${roomId} and stay.tankId = ${tankId} and stay.fishId is not null
       and stay.fromDay <= ${until} and (stay.untilDay is null or stay.untilDay >= ${from})
    union
    select member.fishId,
           max(stay.fromDay, member.fromDay) as fromDay,
           case when stay.untilDay is null then member.untilDay
                when member.untilDay is null then stay.untilDay
                else min(stay.untilDay, member.untilDay) end as untilDay
      from stay
      join colonyMember member on member.roomId = stay.roomId and member.colonyId = stay.colonyId
     where stay.roomId = ${roomId} and stay.tankId = ${tankId}
       and max(stay.fromDay, member.fromDay) <= ${until}
       and (stay.untilDay is null or stay.untilDay >= ${from})
       and (member.untilDay is null or member.untilDay >= ${from})
       and not exists (
         select 1 from stay own
          where own.roomId = stay.roomId and own.fishId = member.fishId and own.tankId <> stay.tankId
            and own.fromDay <= ${from} and (own.untilDay is null or own.untilDay >= ${until}))
  `.execute(db);
  return rows;
}
