import { useEffect } from 'react';
import { SegmentedField } from '@/components/form/SegmentedField';
import { TextField } from '@/components/form/TextField';
import { Text } from '@/components/ui/Text';
import { EntryPage } from '@/features/entries/EntryPage';
import { Part } from '@/features/entries/Part';
import { useEntryForm } from '@/features/entries/useEntryForm';
import { useRoom } from '@/hooks/useRoom';
import { type Day, daysBetween, isDay } from '@/shared/days';
import type { TankRow } from '@/shared/tanks/contract';
import {
  type Around,
  beginningOf,
  begunOf,
  begunSchema,
  CANNOT_TELL,
  type Proposal,
  type Seen,
  startOf,
} from './beginning';
import { careOf, longestHold } from './care';
import { HoldingDays, SpawnDay } from './DayFields';
import { HoldPreview } from './HoldPreview';
import { modeWords } from './modeWords';
import { SireFields } from './SireFields';
import { StrainLine } from './StrainLine';
import { useBeginClash } from './useBeginClash';
import { WhichHolds } from './WhichHolds';
import { WhichSire } from './WhichSire';

type Props = {
  seen: Seen;
  tank: TankRow;
  colonyId: string | null;
  proposal: Proposal;
  /** Other days were typed: who was in the tank then is asked again. */
  onDays: (from: Day, until: Day) => void;
};

/** A look into the tank that is older says nothing about now. */
const LOOK_COUNTS_DAYS = 21;

/** Which female, since when, by which males: a hold begins. */
export function BeginFields({ seen, tank, colonyId, proposal, onDays }: Props) {
  const { today } = useRoom();
  const looked =
    proposal.lookedOn && daysBetween(proposal.lookedOn, today) <= LOOK_COUNTS_DAYS ? proposal.lookedOn : null;
  const colonyStrain = tank.residents.find(({ id }) => id === colonyId)?.strainId;
  const strainOf = (holderId: string) => {
    const strainId = proposal.females.find(({ fishId }) => fishId === holderId)?.strainId ?? colonyStrain;
    return proposal.strains.find((strain) => strain.strainId === strainId) ?? proposal.strains[0] ?? null;
  };
  const around = (holderId: string): Around => {
    const strain = strainOf(holderId);
    // Without a signal the species may not be known here: then the keeper knows it.
    const strips = strain === null || careOf(strain.clock)?.kind === 'strips';
    return { seen, tank, colonyId, proposal, strips, heHolds: strain?.mode === 'paternalMouthbrooder' };
  };
  const words = modeWords(strainOf('')?.mode ?? null);
  const entry = useEntryForm({
    title: seen === 'spawn' ? 'Spawn seen' : words.seen,
    draft: `${seen}:${tank.id}`,
    schema: begunSchema(seen),
    start: startOf(today, looked, strainOf('')?.paternity ?? null),
    content: (value, idOf) => beginningOf(value, around(value.holderId), idOf),
    clashes: true,
  });
  const { holderId, firstSeenOn, notYetOn = '', sireId, plan } = entry.form.values;
  const from = seen === 'spawn' ? firstSeenOn : notYetOn;
  const known = isDay(from) && isDay(firstSeenOn) && from <= firstSeenOn && firstSeenOn <= today;
  useEffect(() => {
    if (known) onDays(from, firstSeenOn);
  });
  const strain = strainOf(holderId);
  const clash = useBeginClash(entry, () => begunOf(entry.form.values), around(holderId));
  const { heHolds, strips } = around(holderId);
  const asksSires = !heHolds && (seen === 'holding' || sireId === CANNOT_TELL);
  const holder = proposal.females.find(({ fishId }) => fishId === holderId);
  return (
    <EntryPage entry={entry} subtitle={<StrainLine tank={tank} strain={strain} />} saveLabel={words.save} clash={clash}>
      <WhichHolds proposal={proposal} words={words} />
      {seen === 'spawn' && !heHolds ? <WhichSire sires={proposal.sires} /> : null}
      {seen === 'spawn' ? (
        <SpawnDay />
      ) : (
        <HoldingDays
          words={words}
          lookedOn={proposal.lookedOn}
          lastEndedOn={holder?.lastEndedOn ?? null}
          longest={longestHold(strain?.clock ?? null)}
        />
      )}
      {known ? (
        <HoldPreview
          facts={strain?.clock ?? null}
          spawn={{ spawnEarliest: from, spawnLatest: firstSeenOn }}
          plan={strips ? plan : 'leave'}
        />
      ) : null}
      {asksSires ? (
        <SireFields sires={proposal.sires} strainId={strain?.strainId ?? null} tankCode={tank.code} />
      ) : null}
      <Part title="Plan">
        {strips ? (
          <SegmentedField
            name="plan"
            label="Plan"
            quiet
            choices={[
              { value: 'strip', word: 'Strip her' },
              { value: 'leave', word: 'Leave her' },
            ]}
          />
        ) : (
          <Text tone="soft">{leaveWords(strain?.mode ?? null)}</Text>
        )}
      </Part>
      <TextField name="note" label="Note" aside="not needed" long />
    </EntryPage>
  );
}

function leaveWords(mode: Proposal['strains'][number]['mode']): string {
  if (mode === 'substrateSpawner') return 'Left to the parents, who guard eggs and fry.';
  if (mode === 'biparentalMouthbrooder') return 'Left to them: she hands the young over to the male. Never stripped.';
  if (mode === 'paternalMouthbrooder') return 'Left to him. Never stripped.';
  return 'Left to her: this species is not stripped.';
}
