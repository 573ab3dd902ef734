import { addDays, type Day } from '../../../shared/days';
import type { Ago, Key, Task } from './shape';

const TASKS: { id: string; title: string; due: Ago; everyDays?: number; for?: Key; about?: Key }[] = [
  { id: 'air', title: 'Change the air stones of the nursery shelf', due: 0, everyDays: 60, for: 'account:pim' },
  {
    id: 'shells',
    title: 'Look into shell 4 with the torch, count hatched',
    due: 1,
    for: 'account:idris',
    about: 'colony:CATE-A',
  },
  { id: 'heater', title: 'Replace the heater of G5', due: -1, for: 'account:nora', about: 'tank:G5' },
  { id: 'second', title: 'Choose a tank for a second MOIL colony', due: 12, for: 'account:nora', about: 'strain:MOIL' },
  {
    id: 'rcd',
    title: 'Press the test button of the residual-current switch',
    due: 6,
    everyDays: 90,
    for: 'account:idris',
  },
  { id: 'frozen', title: 'Order frozen food', due: -2, everyDays: 28, for: 'account:idris' },
  { id: 'move', title: 'Move the MEUT fry out of N2', due: 3, for: 'account:idris', about: 'brood:e4' },
];

export const tasksOn = (today: Day): Task[] =>
  TASKS.map(({ id, title, due, everyDays, about, ...task }) => ({
    key: `task:${id}`,
    title,
    dueOn: addDays(today, due),
    everyDays: everyDays ?? null,
    assignedTo: task.for ?? null,
    about: about ?? null,
  }));
