import type { IconName } from '@/components/ui/iconMarks';
import { type Day, daysBetween, formatShortDay } from '@/shared/days';
import type { Due, DueKind } from '@/shared/today/todayOf';

export const DUE_WORDS: Record<DueKind, string> = {
  holdCheck: 'Check',
  stripWindow: 'Strip window open',
  release: 'Release expected',
  stageCount: 'Count eggs and wrigglers',
  headCount: 'Head count',
  lengthSample: 'Length sample',
  waterTest: 'Water test',
  waterChange: 'Water change',
  treatmentEnd: 'Treatment ends',
  quarantineEnd: 'Quarantine ends',
  reservationEnds: 'Reservation ends',
  answer: 'Answer a buyer',
  own: 'Task',
};

export const DUE_ICONS: Record<DueKind, IconName> = {
  holdCheck: 'holding',
  stripWindow: 'strip',
  release: 'release',
  stageCount: 'headCount',
  headCount: 'headCount',
  lengthSample: 'lengthSample',
  waterTest: 'waterTest',
  waterChange: 'waterChange',
  treatmentEnd: 'tick',
  quarantineEnd: 'tick',
  reservationEnds: 'buyers',
  answer: 'buyers',
  own: 'today',
};

/** "29 heads, last 13 Apr. Take 15 fish." Says since when, or how late, so that the number in the margin is understood. */
export function dueNote({ kind, heads, lastOn, amount, tankCode, lateDays, title }: Due): string {
  const last = lastOn ? `last ${formatShortDay(lastOn)}` : 'never yet';
  const late = lateDays === 0 ? 'due today' : `${lateDays} ${lateDays === 1 ? 'day' : 'days'} late`;
  const where = tankCode ? `, ${tankCode}` : '';
  switch (kind) {
    case 'headCount':
      return `${heads} heads, ${last}${where}. ${capital(late)}.`;
    case 'lengthSample':
      return `${heads} heads, ${last}. Take ${amount} fish. ${capital(late)}.`;
    case 'stageCount':
      return `${capital(last)}${where}. ${capital(late)}.`;
    case 'waterChange':
      return `${capital(last)}${amount ? `, ${amount} %` : ''}. ${capital(late)}.`;
    case 'reservationEnds':
      return `${title}.`;
    case 'answer':
      return `${title}. ${lateDays === 0 ? 'Asked today.' : `Waits for ${lateDays} ${lateDays === 1 ? 'day' : 'days'}.`}`;
    default:
      return `${lastOn ? `${capital(last)}. ` : ''}${capital(late)}.`;
  }
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

/** The margin's number: days since it was last done; where it never was, days late. */
export function dueFigure({ lastOn, lateDays }: Due, today: Day): string {
  return String(lastOn ? daysBetween(lastOn, today) : lateDays);
}
