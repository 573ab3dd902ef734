import { stageOf } from '../broods/stage';
import { addDays, type Day } from '../days';
import { adultMm } from '../species/adultSize';
import type { SpeciesProfile } from '../species/profile';
import { type Due, due } from './due';
import type { TodayFacts } from './facts';
import type { HoldToday } from './holdsToday';
import { SAMPLE_SIZE } from './intervals';

/** Of each hold: a look at it, the strip window while it is to be stripped, the release. */
export function holdDues(holds: HoldToday[], { intervals, today }: TodayFacts): Due[] {
  return holds.flatMap(({ hold, clock }) => {
    const base = {
      thing: 'hold' as const,
      id: hold.id,
      code: hold.holder?.code ?? hold.colony?.code ?? hold.tank.code,
      tankCode: hold.tank.code,
    };
    const lastOn = hold.checkedOn.at(-1) ?? hold.firstSeenOn;
    const dues = [due({ ...base, kind: 'holdCheck', dueOn: addDays(lastOn, intervals.holdCheck), lastOn }, today)];
    if (!clock) return dues;
    const { stripFrom, stripTo, releaseOn, releaseLatest } = clock;
    // Once the window has passed nothing is stripped any more: the release comes.
    if (hold.plan === 'strip' && stripFrom && stripTo && today <= stripTo)
      dues.push(due({ ...base, kind: 'stripWindow', dueOn: stripFrom, untilOn: stripTo }, today));
    dues.push(due({ ...base, kind: 'release', dueOn: releaseOn, untilOn: releaseLatest }, today));
    return dues;
  });
}

/** Of each batch: eggs and wrigglers counted often, later its heads and lengths by its stage. */
export function batchDues(facts: TodayFacts, profiles: Map<string, SpeciesProfile>): Due[] {
  const { batches, intervals, today } = facts;
  return batches.flatMap((batch) => {
    const { openedOn, countedOn, sampledOn, stageCountedOn, startedOn, balance } = batch;
    const base = {
      thing: 'batch' as const,
      id: batch.id,
      code: batch.codes.join(' + '),
      heads: balance,
      tankCode: batch.tank?.code ?? null,
    };
    if (openedOn === null) {
      const lastOn = stageCountedOn ?? startedOn;
      return [due({ ...base, kind: 'stageCount', dueOn: addDays(lastOn, intervals.stageCheck), lastOn }, today)];
    }
    if (balance === 0) return [];
    const stage = intervalStage(batch, openedOn, profiles, today);
    const counted = countedOn ?? openedOn;
    const countOn = addDays(counted, intervals.headCount[stage]);
    const sampleOn = addDays(sampledOn ?? openedOn, intervals.lengthSample[stage]);
    const amount = Math.min(SAMPLE_SIZE, balance);
    return [
      due({ ...base, kind: 'headCount', dueOn: countOn, lastOn: counted }, today),
      due({ ...base, kind: 'lengthSample', dueOn: sampleOn, lastOn: sampledOn, amount }, today),
    ];
  });
}

function intervalStage(
  { spawnLatest, meanTenthsMm, speciesId }: TodayFacts['batches'][number],
  openedOn: Day,
  profiles: Map<string, SpeciesProfile>,
  today: Day,
) {
  const profile = profiles.get(speciesId ?? '');
  const stage = stageOf({
    spawnLatest,
    openedOn,
    meanMm: meanTenthsMm === null ? null : meanTenthsMm / 10,
    adultMm: profile ? adultMm(profile, null) : null,
    today,
  });
  return stage === 'egg' || stage === 'wriggler' ? 'fry' : stage;
}

/** Water tests and changes of every tank with fish in it. */
export function tankDues({ tanks, intervals, today }: TodayFacts): Due[] {
  return tanks.flatMap(({ id, code, stockedSince, testedOn, changedOn, changedPercent }) => {
    if (stockedSince === null) return [];
    const base = { thing: 'tank' as const, id, code, tankCode: code };
    const testOn = addDays(testedOn ?? stockedSince, intervals.waterTest);
    const changeOn = addDays(changedOn ?? stockedSince, intervals.waterChange);
    return [
      due({ ...base, kind: 'waterTest', dueOn: testOn, lastOn: testedOn }, today),
      due({ ...base, kind: 'waterChange', dueOn: changeOn, lastOn: changedOn, amount: changedPercent }, today),
    ];
  });
}

export const isRunning = ({ kind, ended, untilDay }: TodayFacts['care'][number], today: Day): boolean =>
  (kind === 'treatment' || kind === 'quarantine') && !ended && (untilDay === null || untilDay >= today);

/** Treatments and quarantines to be ended. */
export function careDues({ care, tanks, today }: TodayFacts): Due[] {
  return care.flatMap(({ id, kind, ended, untilDay, tankId, what, onDay }) => {
    if ((kind !== 'treatment' && kind !== 'quarantine') || ended || untilDay === null) return [];
    const code = tanks.find((tank) => tank.id === tankId)?.code ?? '?';
    return [
      due(
        {
          thing: 'tank',
          id: tankId,
          kind: kind === 'treatment' ? 'treatmentEnd' : 'quarantineEnd',
          code,
          dueOn: untilDay,
          lastOn: onDay,
          tankCode: code,
          title: what,
          subject: id,
        },
        today,
      ),
    ];
  });
}
