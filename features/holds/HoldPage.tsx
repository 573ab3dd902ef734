import type { ReactNode } from 'react';
import { Screen } from '@/components/ui/Screen';
import { useRoom } from '@/hooks/useRoom';
import { clockOf } from '@/shared/holds/clockOf';
import { may } from '@/shared/roles';
import { EarlierHolds } from './EarlierHolds';
import { HoldActions } from './HoldActions';
import { HoldClockPart } from './HoldClockPart';
import { HoldHead } from './HoldHead';
import { HoldMenu } from './HoldMenu';
import { HoldPlace } from './HoldName';
import { modeWords } from './modeWords';
import { PlanChoice } from './PlanChoice';
import type { HoldTold } from './queries';
import { SireRows } from './SireRows';
import { whoHolds } from './whoHolds';

/** Head, bars, what to do; then the sires, her earlier holds, and what was recorded. */
export function HoldPage({ told, history }: { told: HoldTold; history: ReactNode }) {
  const room = useRoom();
  const { hold, parentage, possibleHybrid, earlier, note } = told;
  const run = clockOf(hold.clock, hold, hold.endedOn ?? room.today);
  const mayRecord = may(room.role, 'entry:record');
  const isOpen = hold.endedOn === null;
  return (
    <Screen
      title={whoHolds(hold)}
      code={hold.holder?.code !== undefined && hold.holder.code !== null}
      sex={modeWords(hold.mode).carer}
      subtitle={<HoldPlace hold={hold} />}
      back={`/r/${room.id}`}
      actions={<HoldMenu hold={hold} />}
    >
      <HoldHead hold={hold} clock={run?.clock ?? null} note={note} />
      {run ? <HoldClockPart hold={hold} clock={run.clock} basedOn={run.basedOn} /> : null}
      {isOpen && mayRecord ? <HoldActions hold={hold} clock={run?.clock ?? null} /> : null}
      {isOpen && run?.clock.kind === 'strips' ? <PlanChoice hold={hold} mayChange={mayRecord} /> : null}
      <SireRows parentage={parentage} possibleHybrid={possibleHybrid} />
      {hold.holder ? <EarlierHolds holds={earlier} /> : null}
      {history}
    </Screen>
  );
}
