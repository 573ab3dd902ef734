import { formatDay } from '../../shared/days';
import type { Due } from '../../shared/today/due';
import { dueNote, dueTitle } from '../../shared/today/dueWords';
import { type Today, todayOf } from '../../shared/today/todayOf';
import type { LetterDraft } from '../mail/writeLetter';
import type { MemberAsked } from './asMember';
import { todayFacts } from './facts';

/** More than this is read on the screen. */
const TOLD = 40;

/** The day in a letter: one's own first, then the latest first. Null when nothing is due. */
export async function dailyLetterOf({ scope, units, roomName, person }: MemberAsked): Promise<LetterDraft | null> {
  const { roomId, accountId, today, house } = scope;
  const day = todayOf(await todayFacts(scope), units);
  const { due } = day;
  const troubles = troubleLines(day);
  if (due.length + troubles.length === 0) return null;
  const mine = due.filter(({ assignedTo }) => assignedTo?.id === accountId);
  const sorted = [...mine, ...due.filter((one) => !mine.includes(one))];
  const home = `${house.config.origin}/r/${roomId}`;
  const rest = sorted.length - TOLD;
  return {
    kind: 'daily',
    to: person.email,
    toName: person.name,
    aboutId: accountId,
    subject: `${roomName}, ${formatDay(today, today)}: ${due.length > 0 ? `${due.length} due` : 'look at the water'}`,
    paragraphs: [opening(due, mine.length), ...troubles],
    facts: sorted.slice(0, TOLD).map((one): [string, string] => [nameOf(one), noteOf(one, accountId)]),
    button: { label: 'Open Today', url: home },
    after: rest > 0 ? [`And ${rest} more.`] : [],
    stopUrl: `${home}/settings/daily`,
  };
}

function opening(due: Due[], mine: number): string {
  if (due.length === 0) return 'Nothing is due today.';
  const late = due.filter(({ lateDays }) => lateDays > 0).length;
  const parts = [
    due.length === 1 ? 'One thing is due' : `${due.length} things are due`,
    ...(late > 0 ? [`${late} late`] : []),
    ...(mine > 0 ? [`${mine} given to you`] : []),
  ];
  return `${parts.join(', ')}.`;
}

const nameOf = (one: Due) => [dueTitle(one), one.code].filter(Boolean).join(', ');

function noteOf(one: Due, accountId: string): string {
  const { assignedTo } = one;
  const whose = assignedTo ? (assignedTo.id === accountId ? 'Yours.' : `For ${assignedTo.name}.`) : '';
  return [dueNote(one), whose].filter(Boolean).join(' ');
}

/** What cannot wait stands before the list. */
const troubleLines = ({ troubles, short }: Today): string[] => [
  ...troubles
    .filter(({ finding }) => finding.level === 'act')
    .map(({ tank, finding }) => `${tank.code}: ${finding.says}.`),
  ...short.map((order) => `Order ${order.number} falls short by ${order.short}: deaths left fewer than are reserved.`),
];
