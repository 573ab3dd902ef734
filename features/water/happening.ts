import * as z from 'zod/mini';
import { NoteDraft } from '@/features/entries/note';
import { LOSS_CAUSES } from '@/shared/broods/headEntry';
import { DayText } from '@/shared/days';
import type { ContentOf } from '@/shared/record/kinds';
import { Heads, line } from '@/shared/shapes';
import { orBlank, spelledHeads } from '@/shared/spelled';

export const IncidentDraft = z.strictObject({
  what: line(200, 'Say what happened'),
  tankIds: z.array(z.string()).check(z.minLength(1, 'Choose at least one tank')),
  cause: z.enum(LOSS_CAUSES, 'Choose a cause'),
  /** Heads lost, by batch. */
  losses: z.record(z.string(), orBlank(spelledHeads(Heads))),
  fishDied: z.array(z.string()),
  onDay: DayText,
  note: NoteDraft,
});
export type Incident = z.output<typeof IncidentDraft>;

/** What happens in fishrooms; anything else is typed. */
export const USUAL_INCIDENTS = [
  'Power cut',
  'Heater failed',
  'Filter stopped',
  'Leak',
  'Rack moved',
  'Overfed',
] as const;

/** The entry; losses and deaths of tanks that were left out again do not count. */
export function incidentOf(value: Incident, isIn: (id: string) => boolean): ContentOf<'incident'> {
  const { what, tankIds, cause, losses, fishDied, onDay, note } = value;
  return {
    kind: 'incident',
    tankIds,
    onDay,
    what,
    losses: Object.entries(losses).flatMap(([batchId, heads]) =>
      heads !== null && isIn(batchId) ? [{ batchId, heads, cause }] : [],
    ),
    fishDied: fishDied.filter(isIn),
    note,
  };
}
