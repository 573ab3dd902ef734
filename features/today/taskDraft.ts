import * as z from 'zod/mini';
import { DayText, isoWeek } from '@/shared/days';
import { orBlank, spelledHeads } from '@/shared/spelled';
import { EveryDays, TaskTitle } from '@/shared/today/contract';
import type { TaskRow } from '@/shared/today/facts';

const Weeks = z
  .number('Type a number of weeks')
  .check(z.int('Whole weeks'), z.minimum(1, 'At least one week'), z.maximum(104, 'At most two years'));

export const NOBODY = 'nobody';
export const NO_TANK = 'none';
const WEEK = 7;

const Typed = z
  .strictObject({
    title: TaskTitle,
    dueOn: DayText,
    repeats: z.enum(['once', 'days', 'weekday'], 'Choose one'),
    everyDays: orBlank(spelledHeads(EveryDays)),
    everyWeeks: orBlank(spelledHeads(Weeks)),
    assignedTo: z.string(),
    tankId: z.string(),
  })
  .check(
    z.refine(({ repeats, everyDays }) => repeats !== 'days' || everyDays !== null, {
      error: 'Type after how many days',
      path: ['everyDays'],
    }),
    z.refine(({ repeats, everyWeeks }) => repeats !== 'weekday' || everyWeeks !== null, {
      error: 'Type every how many weeks',
      path: ['everyWeeks'],
    }),
  );

/** What a keeper fills in, and the task of it. The weekday is that of the day it is due. */
export const TaskDraft = z.pipe(
  Typed,
  z.transform(({ title, dueOn, repeats, everyDays, everyWeeks, assignedTo, tankId }) => ({
    title,
    dueOn,
    everyDays: repeats === 'once' ? null : repeats === 'days' ? everyDays : (everyWeeks ?? 1) * WEEK,
    onWeekday: repeats === 'weekday' ? isoWeek(dueOn).weekday : null,
    assignedTo: assignedTo === NOBODY ? null : assignedTo,
    tankId: tankId === NO_TANK ? null : tankId,
  })),
);

export function startOf(task: TaskRow | null, today: string, tankId: string | undefined): z.input<typeof Typed> {
  const every = task?.everyDays ?? null;
  return {
    title: task?.title ?? '',
    dueOn: task?.dueOn ?? today,
    repeats: every === null ? 'once' : task?.onWeekday ? 'weekday' : 'days',
    everyDays: every === null || task?.onWeekday ? '' : String(every),
    everyWeeks: every !== null && task?.onWeekday ? String(every / WEEK) : '1',
    assignedTo: task?.assignedTo?.id ?? NOBODY,
    tankId: tankId ?? NO_TANK,
  };
}
