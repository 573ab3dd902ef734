import {
  addTask,
  changeIntervals,
  changeTask,
  decideTask,
  endCalendar,
  newCalendar,
  readIntervals,
  readMyDay,
  readTask,
  readToday,
  setDailyLetter,
} from '../../shared/today/contract';
import type { Feature } from '../features';
import { calendarPage } from './calendarPage';
import { startDailyLetters } from './dailyLetters';
import { decide } from './decisions';
import { todayFacts } from './facts';
import { intervalsOf, setIntervals } from './intervals';
import { dropCalendar, makeCalendar, myDay, setLetterHour } from './myDay';
import { addOne, changeOne, ownTask } from './ownTasks';

export { writeDailyLetters } from './dailyLetters';
export { todayFacts } from './facts';
export { intervalsOf } from './intervals';
export { addOne as addTaskFor } from './ownTasks';

export const today: Feature = {
  routes: (serve) => {
    serve.read(readToday, (scope) => todayFacts(scope));
    serve.read(readIntervals, (scope) => intervalsOf(scope));
    serve.write(changeIntervals, (scope, { body }) => setIntervals(scope, body));
    serve.read(readTask, (scope, { params }) => ownTask(scope, params.taskId));
    serve.write(addTask, (scope, { body }) => addOne(scope, body));
    serve.write(changeTask, (scope, { params, body }) => changeOne(scope, params.taskId, body));
    serve.write(decideTask, (scope, { params, body }) => decide(scope, params.taskKey, body));
    serve.read(readMyDay, (scope) => myDay(scope));
    serve.write(setDailyLetter, (scope, { body }) => setLetterHour(scope, body.hour));
    serve.write(newCalendar, (scope) => makeCalendar(scope));
    serve.write(endCalendar, (scope) => dropCalendar(scope));
  },
  pages: calendarPage,
  start: async (house) => startDailyLetters(house),
};
