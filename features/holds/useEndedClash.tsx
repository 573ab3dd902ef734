import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { useRoom } from '@/hooks/useRoom';
import { dayWords } from '@/shared/days';
import { HoldClash } from '@/shared/holds/contract';
import { OUTCOME_WORDS } from '@/shared/holds/entries';
import type { Refusal } from '@/shared/refusal';

/** Someone else recorded the end of this hold meanwhile: what they wrote, and the way there. What was typed stays a draft. */
export function useEndedClash(clash: Refusal | null) {
  const room = useRoom();
  const parsed = clash ? HoldClash.safeParse(clash.current) : null;
  if (!clash || !parsed?.success) return null;
  const { hold, by } = parsed.data;
  const how = hold.outcome ? OUTCOME_WORDS[hold.outcome].toLowerCase() : 'ended';
  const when = hold.endedOn ? ` ${dayWords(hold.endedOn, room.today)}` : '';
  return {
    fields: (
      <Notice
        tone="look"
        alert
        title={`Not saved. ${by ?? 'Someone'} recorded the end of this hold.`}
        words={`It was ${how}${when}${hold.brood ? `, brood ${hold.brood.code}` : ''}. What you typed is kept as a draft.`}
      />
    ),
    dock: <Button kind="primary" grow label="Open the hold" href={`/r/${room.id}/holds/${hold.id}`} />,
  };
}
