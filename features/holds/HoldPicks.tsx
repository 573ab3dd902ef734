import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { useRoom } from '@/hooks/useRoom';
import { clockOf } from '@/shared/holds/clockOf';
import { daysHeld, nextInClock } from '@/shared/holds/clockWords';
import type { HoldRow } from '@/shared/holds/contract';
import { HoldName, HoldPlace } from './HoldName';
import { whoHolds } from './whoHolds';

/** Open holds to choose from, the next date first. */
export function HoldPicks({ holds, onPick }: { holds: readonly HoldRow[]; onPick: (holdId: string) => void }) {
  const { today } = useRoom();
  const lines = holds
    .map((hold) => ({ hold, clock: clockOf(hold.clock, hold, today)?.clock ?? null }))
    .sort((a, b) => ((a.clock?.releaseOn ?? '9') < (b.clock?.releaseOn ?? '9') ? -1 : 1));
  return (
    <Rows label="Open holds">
      {lines.map(({ hold, clock }) => {
        const who = whoHolds(hold);
        const next = clock ? nextInClock(clock, hold.plan) : '';
        const day = String(daysHeld(hold, today));
        return (
          <Row
            key={hold.id}
            onPress={() => onPick(hold.id)}
            label={`${who} in ${hold.tank.code}, day ${day}. ${next}`}
            figure={day}
            unit="day"
            title={<HoldName hold={hold} />}
            state={next}
            note={<HoldPlace hold={hold} />}
          />
        );
      })}
    </Rows>
  );
}
