import { type Pick, PickField } from '@/components/form/PickGrid';
import { Part } from '@/features/entries/Part';
import { useRoom } from '@/hooks/useRoom';
import { daysBetween } from '@/shared/days';
import { CANNOT_TELL, type Proposal } from './beginning';
import type { ModeWords } from './modeWords';
import { shortCodes } from './shortCode';

type Candidate = Proposal['females'][number] | Proposal['sires'][number];

type Props = { proposal: Proposal; words: ModeWords; onPicked?: (fishId: string) => void };

/** The fish that may hold, those that do already with the day they are on, and last that one can't tell which. */
export function WhichHolds({ proposal, words, onPicked }: Props) {
  const { today } = useRoom();
  const fish: readonly Candidate[] = words.carer === 'male' ? proposal.sires : proposal.females;
  const coded = fish.filter(({ code }) => code !== null);
  const short = shortCodes(coded.flatMap(({ code }) => code ?? []));
  const holding = fish.filter(({ openHoldId }) => openHoldId !== null).length;
  const anonymous = fish.length - coded.length;
  const picks: Pick[] = coded.map(({ fishId, code, sex, openHoldId, holdingSince }) => ({
    value: fishId,
    code: short(code ?? ''),
    sex,
    ...(openHoldId && holdingSince ? { off: true, note: `day ${daysBetween(holdingSince, today) + 1}` } : {}),
  }));
  const cannotTell: Pick = {
    value: CANNOT_TELL,
    word: words.cannotTell,
    ...(anonymous > 0 ? { note: `${anonymous} not told apart` } : {}),
  };
  return (
    <Part title={words.which} aside={holding > 0 ? `${holding} ${words.already}` : undefined}>
      <PickField
        name="holderId"
        label={words.which}
        picks={[...picks, cannotTell]}
        {...(onPicked ? { onPicked } : {})}
      />
    </Part>
  );
}
