import type * as z from 'zod/mini';
import { notFound, Refusal } from '../../shared/refusal';
import type { decideTask } from '../../shared/today/contract';
import { isDueKey } from '../../shared/today/due';
import type { TaskRow } from '../../shared/today/facts';
import { nextDueOn } from '../../shared/today/repeat';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import type { Scope } from '../scope';
import { addOne, ownTask } from './ownTasks';
import { doesTasks, mustDoTasks, oneTask } from './tasks';

type Decision = z.output<typeof decideTask.body>;

const AUDITED: Record<Decision['decision'], string> = {
  done: 'task done',
  skip: 'task skipped',
  snooze: 'task put off',
  assign: 'task given',
  open: 'task brought back',
};

/** Decides about a task. One's own that comes back is there again as soon as it is done or skipped. */
export async function decide(scope: Scope, taskKey: string, decision: Decision): Promise<TaskRow> {
  mustMakeSense(scope, decision);
  const task = await taskOf(scope, taskKey);
  await mustDoTasks(scope, decision.assignedTo);
  const settles = decision.decision === 'done' || decision.decision === 'skip';
  // Pressed twice, or on two phones: the first one counts, and it comes back once.
  if (settles && task.doneAt !== null) return task;
  if (decision.decision === 'open') await takeNextBack(scope, task);
  await scope.db
    .updateTable('task')
    .set({ ...changesOf(scope, decision), version: task.version + 1 })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', task.id)
    .execute();
  await audit(scope, { action: AUDITED[decision.decision], about: 'task', aboutId: task.id });
  if (settles) await comeBack(scope, task);
  return oneTask(scope, task.id);
}

function mustMakeSense({ today }: Scope, { decision, because, until }: Decision): void {
  if (decision === 'skip' && !because)
    throw new Refusal('invalid', 'Say why it is skipped', { because: 'Say why it is skipped' });
  if (decision === 'snooze' && (!until || until <= today))
    throw new Refusal('invalid', 'Choose a day after today', { until: 'Choose a day after today' });
}

/** One's own by its id; one that is worked out by its key, with a row made for the first word about it. */
async function taskOf(scope: Scope, taskKey: string): Promise<TaskRow> {
  const { db, roomId, now } = scope;
  const ownId = /^own:(.+)$/.exec(taskKey)?.[1];
  if (ownId) return ownTask(scope, ownId);
  if (!isDueKey(taskKey)) throw notFound('That task');
  const known = await db
    .selectFrom('task')
    .where('roomId', '=', roomId)
    .where('taskKey', '=', taskKey)
    .select('id')
    .executeTakeFirst();
  if (known) return oneTask(scope, known.id);
  const id = newId(now);
  await db.insertInto('task').values({ roomId, id, taskKey, createdAt: now }).execute();
  return oneTask(scope, id);
}

function changesOf({ now, actorId }: Scope, { decision, because, until, assignedTo }: Decision) {
  switch (decision) {
    case 'done':
      return { doneAt: now, doneBy: actorId, skippedBecause: null };
    case 'skip':
      return { doneAt: now, doneBy: actorId, skippedBecause: because };
    case 'snooze':
      return { snoozedUntil: until };
    case 'assign':
      return { assignedTo };
    case 'open':
      return { doneAt: null, doneBy: null, skippedBecause: null, snoozedUntil: null };
  }
}

async function comeBack(scope: Scope, task: TaskRow): Promise<void> {
  const { id, title, dueOn, everyDays, onWeekday, about } = task;
  const next = dueOn && nextDueOn({ dueOn, everyDays, onWeekday }, scope.today);
  if (!next || !title) return;
  const assignedTo = await stillGiven(scope, task);
  await addOne(scope, { id: newId(scope.now), title, dueOn: next, everyDays, onWeekday, assignedTo, about }, id);
}

/** Whoever it was given to may have left, or only look on by now. */
const stillGiven = async (scope: Scope, { assignedTo }: TaskRow): Promise<string | null> =>
  assignedTo && (await doesTasks(scope, assignedTo.id)) ? assignedTo.id : null;

/** What is brought back is not to be there twice. */
async function takeNextBack({ db, roomId }: Scope, { id }: TaskRow): Promise<void> {
  const next = await db
    .selectFrom('task')
    .where('roomId', '=', roomId)
    .where('followsId', '=', id)
    .select(['id', 'doneAt'])
    .executeTakeFirst();
  if (!next) return;
  if (next.doneAt !== null) throw new Refusal('conflict', 'It has come back since and was done. Bring that one back');
  await db.deleteFrom('task').where('roomId', '=', roomId).where('id', '=', next.id).execute();
}
