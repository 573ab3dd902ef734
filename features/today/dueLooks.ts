import type { IconName } from '@/components/ui/iconMarks';
import { type Day, daysBetween } from '@/shared/days';
import { may, type Role } from '@/shared/roles';
import type { Due, DueKind } from '@/shared/today/due';

export const DUE_ICONS: Record<DueKind, IconName> = {
  holdCheck: 'holding',
  stripWindow: 'strip',
  release: 'release',
  stageCount: 'headCount',
  headCount: 'headCount',
  lengthSample: 'lengthSample',
  waterTest: 'waterTest',
  waterChange: 'waterChange',
  treatmentEnd: 'treatment',
  quarantineEnd: 'treatment',
  collection: 'buyers',
  reservationEnds: 'buyers',
  answer: 'buyers',
  own: 'note',
};

/** The margin's number: days since it was last done; where it never was, days late. */
export function dueFigure({ lastOn, lateDays }: Due, today: Day): string {
  return String(lastOn ? daysBetween(lastOn, today) : lateDays);
}

type Where = { id: string; role: Role };

/** Straight to the form that settles it, filled in; for those who only look on, to the thing itself. */
export function dueHref({ id: roomId, role }: Where, { kind, id, thing }: Due) {
  const home = `/r/${roomId}` as const;
  if (thing === 'task') return `${home}/tasks/${id}` as const;
  if (thing === 'request') return `${home}/buyers/requests/${id}` as const;
  if (thing === 'order') return `${home}/orders/${id}` as const;
  if (thing === 'hold') return `${home}/holds/${id}` as const;
  if (may(role, 'entry:record')) {
    const form = FORMS[kind];
    if (form) return `${home}/record/${form}?${thing}=${id}` as const;
  }
  return thing === 'batch' ? (`${home}/batches/${id}` as const) : (`${home}/tanks/${id}` as const);
}

const FORMS: Partial<Record<DueKind, 'stage-count' | 'head-count' | 'length-sample' | 'water-test' | 'water-change'>> =
  {
    stageCount: 'stage-count',
    headCount: 'head-count',
    lengthSample: 'length-sample',
    waterTest: 'water-test',
    waterChange: 'water-change',
  };
