import { addDays, formatShortDay } from '../days';
import { type Due, due } from './due';
import type { TaskRow, TodayFacts } from './facts';

/** Whoever waits for an answer, who comes for fish, and a word to the buyer before reserved fish are free again. */
export function orderDues({ orders, intervals, today }: TodayFacts): Due[] {
  return orders.flatMap(({ id, number, reservedUntil, waitsSince, what, time }) => {
    const order = { thing: 'order' as const, id, code: String(number) };
    const dues = waitsSince ? [due({ ...order, kind: 'answer', dueOn: waitsSince, title: what }, today)] : [];
    if (time) {
      const title = `${time.slice(11, 16)}, ${what}`;
      dues.push(due({ ...order, kind: 'collection', dueOn: time.slice(0, 10), title }, today));
    }
    if (reservedUntil) {
      const title = `Held until ${formatShortDay(reservedUntil)}`;
      const dueOn = addDays(reservedUntil, -intervals.reservationEnds);
      dues.push(due({ ...order, kind: 'reservationEnds', dueOn, title }, today));
    }
    return dues;
  });
}

/** Whoever asked on the public page, once there are fish to answer with. */
export function requestDues({ requests, today }: TodayFacts): Due[] {
  return requests.map(({ id, code, what, buyerName, waitsSince }) =>
    due({ thing: 'request', id, code, kind: 'answer', dueOn: waitsSince, title: `${buyerName}, ${what}` }, today),
  );
}

/** The fishroom's own tasks: those still to do, and those done, skipped or put off. */
export function ownDues(facts: TodayFacts): Due[] {
  return facts.tasks.flatMap((task) => {
    const { id, taskKey, title, dueOn, assignedTo } = task;
    if (taskKey !== 'own' || !dueOn) return [];
    const code = codeOf(task, facts);
    return [due({ thing: 'task', id, kind: 'own', code, dueOn, title, assignedTo, own: task }, facts.today)];
  });
}

/** The code of what a task is about, as far as Today's facts know it. */
function codeOf({ about }: TaskRow, { tanks, broods, batches, holds }: TodayFacts): string {
  if (!about) return '';
  switch (about.thing) {
    case 'tank':
      return tanks.find(({ id }) => id === about.id)?.code ?? '';
    case 'brood':
      return broods.find(({ id }) => id === about.id)?.code ?? '';
    case 'batch':
      return batches.find(({ id }) => id === about.id)?.codes.join(' + ') ?? '';
    case 'hold':
      return holds.find(({ id }) => id === about.id)?.holder?.code ?? '';
    default:
      return '';
  }
}
