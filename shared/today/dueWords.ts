import { formatShortDay } from '../days';
import type { Due, DueKind } from './due';
import { repeatWords } from './repeat';

const DUE_WORDS: Record<DueKind, string> = {
  holdCheck: 'Check',
  stripWindow: 'Strip window',
  release: 'Release expected',
  stageCount: 'Count eggs and wrigglers',
  headCount: 'Head count',
  lengthSample: 'Length sample',
  waterTest: 'Water test',
  waterChange: 'Water change',
  treatmentEnd: 'Treatment ends',
  quarantineEnd: 'Quarantine ends',
  collection: 'Collection',
  reservationEnds: 'Reservation ends',
  answer: 'Answer a buyer',
  own: 'Task',
};

/** What is to be done, without of what: "Head count", "Clean the canister". */
export const dueTitle = ({ kind, title }: Pick<Due, 'kind' | 'title'>): string =>
  kind === 'own' ? (title ?? DUE_WORDS.own) : DUE_WORDS[kind];

const days = (count: number) => `${count} ${count === 1 ? 'day' : 'days'}`;

function lateWords(lateDays: number): string {
  if (lateDays < 0) return lateDays === -1 ? 'due tomorrow' : `due in ${days(-lateDays)}`;
  return lateDays === 0 ? 'due today' : `${days(lateDays)} late`;
}

/** "29 heads, last 13 Apr. Take 15 fish." Says since when, or how late, so that the number in the margin is understood. */
export function dueNote(due: Due): string {
  const { kind, heads, lastOn, amount, lateDays, title, own, putOffFrom, dueOn, untilOn } = due;
  const last = lastOn ? `last ${formatShortDay(lastOn)}` : 'never yet';
  const late = `${capital(lateWords(lateDays))}${putOffFrom ? `, put off from ${formatShortDay(putOffFrom)}` : ''}.`;
  const tank = due.tankCode === due.code ? null : due.tankCode;
  const where = tank ? `, ${tank}` : '';
  switch (kind) {
    case 'headCount':
      return `${heads} heads, ${last}${where}. ${late}`;
    case 'lengthSample':
      return `${heads} heads, ${last}. Take ${amount} fish. ${late}`;
    case 'stageCount':
      return `${capital(last)}${where}. ${late}`;
    case 'waterChange':
      return `${capital(last)}${amount ? `, ${amount} %` : ''}. ${late}`;
    case 'reservationEnds':
    case 'collection':
      return `${title}.`;
    case 'answer':
      return `${title}. ${lateDays === 0 ? 'Asked today.' : `Waits for ${days(lateDays)}.`}`;
    case 'treatmentEnd':
    case 'quarantineEnd':
      return `${title ? `${title}, ` : ''}since ${lastOn ? formatShortDay(lastOn) : '?'}. ${late}`;
    case 'own': {
      const rhythm = own ? repeatWords(own) : null;
      return rhythm ? `${late.slice(0, -1)}, ${rhythm}.` : late;
    }
    case 'stripWindow':
      return `${tank ? `${tank}, from` : 'From'} ${formatShortDay(dueOn)} to ${formatShortDay(untilOn ?? dueOn)}.`;
    case 'release':
      return `${tank ? `${tank}, about` : 'About'} ${formatShortDay(dueOn)}, by ${formatShortDay(untilOn ?? dueOn)}. ${late}`;
    default:
      return `${lastOn ? `${capital(last)}${where}. ` : ''}${late}`;
  }
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);
