import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line, Version } from '../shapes';
import { TaskRow, TodayFacts } from './facts';
import { Intervals } from './intervals';

export const readToday = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/today',
  needs: 'task:see',
  params: inRoom({}),
  output: TodayFacts,
});

export const readIntervals = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/intervals',
  needs: 'room:see',
  params: inRoom({}),
  output: Intervals,
});

export const changeIntervals = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/intervals',
  needs: 'room:manage',
  params: inRoom({}),
  body: Intervals,
  output: Intervals,
});

export const DECISIONS = ['done', 'skip', 'snooze', 'assign', 'open'] as const;

/** Why it is skipped, in a line. */
export const Because = line(200, 'Say why');

/** Done, skipped with a reason, put off, or given to someone: of a task that is worked out (by its key) or one's own. */
export const decideTask = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/tasks/:taskKey',
  needs: 'task:write',
  params: inRoom({ taskKey: z.string().check(z.minLength(1), z.maxLength(200)) }),
  body: z.strictObject({
    decision: z.enum(DECISIONS, 'Choose what to do with it'),
    because: z.nullable(Because),
    until: z.nullable(DayText),
    assignedTo: z.nullable(Id),
  }),
  output: TaskRow,
});

export const TaskTitle = line(120, 'Say what is to be done');

/** After how many days a task comes back. */
export const EveryDays = z
  .number('Type a number of days')
  .check(z.int('Whole days'), z.minimum(1, 'At least one day'), z.maximum(730, 'At most two years'));

const told = {
  title: TaskTitle,
  dueOn: DayText,
  everyDays: z.nullable(EveryDays),
  onWeekday: z.nullable(z.number('Choose a weekday').check(z.int(), z.minimum(1), z.maximum(7))),
  assignedTo: z.nullable(Id),
};

export const addTask = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/tasks',
  needs: 'task:write',
  params: inRoom({}),
  body: z.strictObject({
    id: Id,
    ...told,
    about: z.nullable(
      z.strictObject({ thing: z.enum(['tank', 'colony', 'fish', 'hold', 'brood', 'batch', 'strain']), id: Id }),
    ),
  }),
  output: TaskRow,
});

export const changeTask = endpoint({
  method: 'PATCH',
  path: '/api/rooms/:roomId/own-tasks/:taskId',
  needs: 'task:write',
  params: inRoom({ taskId: Id }),
  body: z.strictObject({ version: Version, ...told }),
  output: TaskRow,
});

/** One of the fishroom's own tasks, to be changed. */
export const readTask = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/own-tasks/:taskId',
  needs: 'task:see',
  params: inRoom({ taskId: Id }),
  output: TaskRow,
});

const Hour = z
  .number('Choose an hour')
  .check(z.int('A whole hour'), z.minimum(0, 'From 0 o’clock'), z.maximum(23, 'To 23 o’clock'));

/** What one has sent to oneself of the day in this fishroom. */
export const MyDay = z.strictObject({
  /** Of the fishroom's clock; null: no letter. */
  letterHour: z.nullable(Hour),
  /** Anyone who has the address can read along. */
  calendarUrl: z.nullable(z.string()),
});
export type MyDay = z.output<typeof MyDay>;

export const readMyDay = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/my-day',
  needs: 'task:see',
  params: inRoom({}),
  output: MyDay,
});

export const setDailyLetter = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/my-day/letter',
  needs: 'task:see',
  params: inRoom({}),
  body: z.strictObject({ hour: z.nullable(Hour) }),
  output: MyDay,
});

/** A new address for one's calendar; the one before, if there was one, ends. */
export const newCalendar = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/my-day/calendar',
  needs: 'task:see',
  params: inRoom({}),
  output: MyDay,
});

export const endCalendar = endpoint({
  method: 'DELETE',
  path: '/api/rooms/:roomId/my-day/calendar',
  needs: 'task:see',
  params: inRoom({}),
  output: MyDay,
});
