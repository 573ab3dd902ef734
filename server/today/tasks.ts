import type * as z from 'zod/mini';
import { addDays } from '../../shared/days';
import { notFound, Refusal } from '../../shared/refusal';
import type { addTask, changeTask, decideTask } from '../../shared/today/contract';
import type { TaskRow } from '../../shared/today/facts';
import { newId } from '../db/newId';
import type { Scope } from '../scope';

/** Open tasks of the fishroom's own, and what was decided about those that are worked out. */
export async function taskRows({ db, roomId, today }: Scope, taskId?: string): Promise<TaskRow[]> {
  let query = db
    .selectFrom('task')
    .leftJoin('account', 'account.id', 'task.assignedTo')
    .where('task.roomId', '=', roomId)
    .select([
      'task.id',
      'taskKey',
      'title',
      'about',
      'dueOn',
      'everyDays',
      'assignedTo',
      'account.name',
      'snoozedUntil',
      'doneAt',
      'skippedBecause',
      'task.version',
    ]);
  // A decision about a date long past decides nothing any more.
  if (taskId) query = query.where('task.id', '=', taskId);
  else query = query.where(({ or, eb }) => or([eb('doneAt', 'is', null), eb('doneAt', '>', addDays(today, -400))]));
  const rows = await query.orderBy('task.dueOn').orderBy('task.id').execute();
  return rows.map(({ about, assignedTo, name, ...row }) => ({
    ...row,
    about: about ? JSON.parse(about) : null,
    assignedTo: assignedTo ? { id: assignedTo, name: name ?? '' } : null,
  }));
}

export async function oneTask(scope: Scope, taskId: string): Promise<TaskRow> {
  const [task] = await taskRows(scope, taskId);
  if (!task) throw notFound('That task');
  return task;
}

async function mustBeMember({ db, roomId }: Scope, accountId: string | null): Promise<void> {
  if (!accountId) return;
  const member = await db
    .selectFrom('member')
    .where('roomId', '=', roomId)
    .where('accountId', '=', accountId)
    .select('role')
    .executeTakeFirst();
  if (!member)
    throw new Refusal('invalid', 'Choose someone of this fishroom', { assignedTo: 'Choose someone of this fishroom' });
}

export async function addOne(scope: Scope, { id, about, ...facts }: z.output<typeof addTask.body>): Promise<TaskRow> {
  await mustBeMember(scope, facts.assignedTo);
  await scope.db
    .insertInto('task')
    .values({
      roomId: scope.roomId,
      id,
      taskKey: 'own',
      about: about && JSON.stringify(about),
      ...facts,
      snoozedUntil: null,
      doneAt: null,
      doneBy: null,
      skippedBecause: null,
      createdAt: scope.now,
    })
    .execute();
  return oneTask(scope, id);
}

export async function changeOne(
  scope: Scope,
  taskId: string,
  { version, ...facts }: z.output<typeof changeTask.body>,
): Promise<TaskRow> {
  const before = await oneTask(scope, taskId);
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this task meanwhile', {}, { current: before });
  await mustBeMember(scope, facts.assignedTo);
  await scope.db
    .updateTable('task')
    .set({ ...facts, version: version + 1 })
    .where('roomId', '=', scope.roomId)
    .where('id', '=', taskId)
    .execute();
  return oneTask(scope, taskId);
}

type Decision = z.output<typeof decideTask.body>;

/** Decides about a task. A recurring task of one's own that is done comes back so many days later. */
export async function decide(scope: Scope, taskKey: string, decision: Decision): Promise<TaskRow> {
  await mustBeMember(scope, decision.assignedTo);
  if (decision.decision === 'skip' && !decision.because)
    throw new Refusal('invalid', 'Say why it is skipped', { because: 'Say why' });
  if (decision.decision === 'snooze' && (!decision.until || decision.until <= scope.today)) {
    throw new Refusal('invalid', 'Choose a day to come back to it', { until: 'Choose a later day' });
  }
  const { db, roomId, now } = scope;
  const ownId = /^own:(.+)$/.exec(taskKey)?.[1];
  const known = ownId
    ? await oneTask(scope, ownId)
    : await db
        .selectFrom('task')
        .where('roomId', '=', roomId)
        .where('taskKey', '=', taskKey)
        .select('id')
        .executeTakeFirst();
  const id = known?.id ?? newId(now);
  if (!known) {
    await db
      .insertInto('task')
      .values({
        roomId,
        id,
        taskKey,
        title: null,
        about: null,
        dueOn: null,
        everyDays: null,
        assignedTo: null,
        snoozedUntil: null,
        doneAt: null,
        doneBy: null,
        skippedBecause: null,
        createdAt: now,
      })
      .execute();
  }
  const task = await oneTask(scope, id);
  await db
    .updateTable('task')
    .set({ ...changesOf(scope, decision), version: task.version + 1 })
    .where('roomId', '=', roomId)
    .where('id', '=', id)
    .execute();
  if (decision.decision === 'done' && task.everyDays && task.title) {
    await addOne(scope, {
      id: newId(now),
      title: task.title,
      dueOn: addDays(scope.today, task.everyDays),
      everyDays: task.everyDays,
      assignedTo: task.assignedTo?.id ?? null,
      about: null,
    });
  }
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
