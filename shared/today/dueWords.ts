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

/** "29 heads, last 13 Apr, G3. Take 15 fish." What is known of it, whatever day it is read. */
export function dueFacts(due: Due): string {
  const { kind, heads, lastOn, amount, title, own, dueOn, untilOn } = due;
  const tank = due.tankCode === due.code ? null : due.tankCode;
  const last = lastOn ? `last ${formatShortDay(lastOn)}` : 'never yet';
  switch (kind) {
    case 'headCount':
      return sentence(`${heads} heads`, last, tank);
    case 'lengthSample':
      return `${sentence(`${heads} heads`, last)} Take ${amount} fish.`;
    case 'waterChange':
      return sentence(last, amount && `${amount} %`);
    case 'stageCount':
    case 'holdCheck':
    case 'waterTest':
      return sentence(last, tank);
    case 'treatmentEnd':
    case 'quarantineEnd':
      return sentence(title, lastOn && `since ${formatShortDay(lastOn)}`);
    case 'stripWindow':
      return sentence(tank, `${formatShortDay(dueOn)} to ${formatShortDay(untilOn ?? dueOn)}`);
    case 'release':
      return sentence(tank, `about ${formatShortDay(dueOn)}`, untilOn && `by ${formatShortDay(untilOn)}`);
    case 'own':
      return sentence(own && repeatWords(own));
    default:
      return sentence(title);
  }
}

/** The same with how late it is, so that the number in the margin is understood. */
export function dueNote(due: Due): string {
  const { kind, lateDays, putOffFrom } = due;
  const facts = dueFacts(due);
  const then = putOffFrom ? `put off from ${formatShortDay(putOffFrom)}` : null;
  if (kind === 'reservationEnds' || kind === 'stripWindow' || (kind === 'collection' && lateDays <= 0))
    return [facts, then && sentence(then)].filter(Boolean).join(' ');
  if (kind === 'answer') return `${facts} ${lateDays === 0 ? 'Asked today.' : `Waits for ${days(lateDays)}.`}`;
  return [facts, sentence(lateWords(lateDays), then)].filter(Boolean).join(' ');
}

/** Parts of a sentence that there are; empty when there are none. */
function sentence(...parts: (string | number | null | undefined | false)[]): string {
  const words = parts.filter(Boolean).join(', ');
  return words && `${words.charAt(0).toUpperCase()}${words.slice(1)}.`;
}
