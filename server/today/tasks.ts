import { addDays } from '../../shared/days';
import { notFound, Refusal } from '../../shared/refusal';
import { may } from '../../shared/roles';
import type { TaskRow } from '../../shared/today/facts';
import type { Scope } from '../scope';

/** A decision about a date so long past decides nothing any more. */
const KEPT_DAYS = 400;

/** Tasks of the fishroom's own, and what was decided about those that are worked out. */
export async function taskRows({ db, roomId, today }: Scope, taskId?: string): Promise<TaskRow[]> {
  let query = db
    .selectFrom('task')
    .leftJoin('account as given', 'given.id', 'task.assignedTo')
    .leftJoin('account as doer', 'doer.id', 'task.doneBy')
    .where('task.roomId', '=', roomId)
    .select([
      'task.id',
      'taskKey',
      'title',
      'about',
      'dueOn',
      'everyDays',
      'onWeekday',
      'assignedTo',
      'given.name as givenName',
      'snoozedUntil',
      'doneAt',
      'doer.name as doneBy',
      'skippedBecause',
      'task.version',
    ]);
  if (taskId) query = query.where('task.id', '=', taskId);
  else
    query = query.where(({ or, eb }) => or([eb('doneAt', 'is', null), eb('doneAt', '>', addDays(today, -KEPT_DAYS))]));
  const rows = await query.orderBy('task.dueOn').orderBy('task.id').execute();
  return rows.map(({ about, assignedTo, givenName, ...row }) => ({
    ...row,
    about: about ? JSON.parse(about) : null,
    assignedTo: assignedTo ? { id: assignedTo, name: givenName ?? '' } : null,
  }));
}

export async function oneTask(scope: Scope, taskId: string): Promise<TaskRow> {
  const [task] = await taskRows(scope, taskId);
  if (!task) throw notFound('That task');
  return task;
}

/** Whether someone is a member whose role does tasks. */
export async function doesTasks({ db, roomId }: Scope, accountId: string): Promise<boolean> {
  const member = await db
    .selectFrom('member')
    .where('roomId', '=', roomId)
    .where('accountId', '=', accountId)
    .select('role')
    .executeTakeFirst();
  return member !== undefined && may(member.role, 'task:write');
}

export async function mustDoTasks(scope: Scope, accountId: string | null): Promise<void> {
  if (accountId === null || (await doesTasks(scope, accountId))) return;
  const words = 'Choose someone of this fishroom who may do tasks';
  throw new Refusal('invalid', words, { assignedTo: words });
}
