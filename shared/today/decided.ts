import { type Due, lateDaysOf } from './due';
import type { TaskRow, TodayFacts } from './facts';

/** A task that was done or skipped, with what was decided. */
export type Settled = Due & { decision: TaskRow & { doneAt: string } };

/** What was decided about each: done and skipped ones are settled, put-off ones wait until their day. */
export function decided(dues: Due[], { tasks, today }: TodayFacts): { open: Due[]; settled: Settled[] } {
  const byKey = new Map(tasks.map((task) => [task.taskKey === 'own' ? `own:${task.id}` : task.taskKey, task]));
  const open: Due[] = [];
  const settled: Settled[] = [];
  for (const one of dues) {
    const decision = byKey.get(one.key);
    if (!decision) open.push(one);
    else if (decision.doneAt !== null) settled.push({ ...one, decision: { ...decision, doneAt: decision.doneAt } });
    else open.push(putOff({ ...one, assignedTo: decision.assignedTo }, decision.snoozedUntil, today));
  }
  return { open, settled };
}

function putOff(one: Due, until: string | null, today: string): Due {
  if (until === null || until <= one.dueOn) return one;
  const later = { ...one, dueOn: until, putOffFrom: one.dueOn };
  return { ...later, lateDays: lateDaysOf(later, today) };
}
