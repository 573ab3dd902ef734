import {
  addTask,
  changeIntervals,
  changeTask,
  decideTask,
  readIntervals,
  readToday,
} from '../../shared/today/contract';
import type { Feature } from '../features';
import { todayFacts } from './facts';
import { intervalsOf, setIntervals } from './intervals';
import { addOne, changeOne, decide } from './tasks';

export { todayFacts } from './facts';
export { intervalsOf } from './intervals';
export { addOne as addTaskFor } from './tasks';

export const today: Feature = {
  routes: (serve) => {
    serve.read(readToday, (scope) => todayFacts(scope));
    serve.read(readIntervals, (scope) => intervalsOf(scope));
    serve.write(changeIntervals, (scope, { body }) => setIntervals(scope, body));
    serve.write(addTask, (scope, { body }) => addOne(scope, body));
    serve.write(changeTask, (scope, { params, body }) => changeOne(scope, params.taskId, body));
    serve.write(decideTask, (scope, { params, body }) => decide(scope, params.taskKey, body));
  },
};
