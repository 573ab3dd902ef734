import type * as z from 'zod/mini';
import { notFound, Refusal } from '../../shared/refusal';
import type { addTask, changeTask } from '../../shared/today/contract';
import type { TaskRow } from '../../shared/today/facts';
import { type Repeat, repeatTrouble } from '../../shared/today/repeat';
import { audit } from '../db/audit';
import type { Scope } from '../scope';
import { mustDoTasks, oneTask } from './tasks';

type Added = Omit<z.output<typeof addTask.body>, 'about'> & Pick<TaskRow, 'about'>;

export async function addOne(scope: Scope, { id, about, ...facts }: Added, followsId?: string): Promise<TaskRow> {
  mustRepeat(facts);
  await mustDoTasks(scope, facts.assignedTo);
  await scope.db
    .insertInto('task')
    .values({
      roomId: scope.roomId,
      id,
      taskKey: 'own',
      about: about && JSON.stringify(about),
      ...facts,
      followsId: followsId ?? null,
      snoozedUntil: null,
      doneAt: null,
      doneBy: null,
      skippedBecause: null,
      createdAt: scope.now,
    })
    .execute();
  await audit(scope, { action: 'task added', about: 'task', aboutId: id });
  return oneTask(scope, id);
}

export async function ownTask(scope: Scope, taskId: string): Promise<TaskRow> {
  const task = await oneTask(scope, taskId);
  if (task.taskKey !== 'own') throw notFound('That task');
  return task;
}

export async function changeOne(
  scope: Scope,
  taskId: string,
  { version, ...facts }: z.output<typeof changeTask.body>,
): Promise<TaskRow> {
  const before = await ownTask(scope, taskId);
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this task meanwhile', {}, { current: before });
  if (before.doneAt !== null) throw new Refusal('conflict', 'This task is done. Bring it back first');
  mustRepeat(facts);
  await mustDoTasks(scope, facts.assignedTo);
  await scope.db
    .updateTable('task')
    // Another day is the word about when: what was put off before is over.
    .set({ ...facts, version: version + 1, ...(facts.dueOn === before.dueOn ? {} : { snoozedUntil: null }) })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', taskId)
    .execute();
  const change = { dueOn: [before.dueOn, facts.dueOn] satisfies [unknown, unknown] };
  await audit(scope, { action: 'task changed', about: 'task', aboutId: taskId, change });
  return oneTask(scope, taskId);
}

function mustRepeat(repeat: Repeat): void {
  const trouble = repeatTrouble(repeat);
  const [first] = Object.values(trouble);
  if (first) throw new Refusal('invalid', first, trouble);
}
