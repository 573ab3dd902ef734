import {
  addTask,
  changeIntervals,
  changeTask,
  decideTask,
  readIntervals,
  readTask,
  readToday,
} from '../../shared/today/contract';
import type { Feature } from '../features';
import { decide } from './decisions';
import { todayFacts } from './facts';
import { intervalsOf, setIntervals } from './intervals';
import { addOne, changeOne, ownTask } from './ownTasks';

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
  },
};
