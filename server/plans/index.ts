import { addPlan, carryOutPlan, dropPlan, listPlans, readPlan } from '../../shared/plans/contract';
import type { Feature } from '../features';
import { addOne, carryOut, drop, onePlan, planRows } from './plans';

export const plans: Feature = {
  routes: (serve) => {
    serve.read(listPlans, async (scope) => ({ plans: await planRows(scope) }));
    serve.read(readPlan, (scope, { params }) => onePlan(scope, params.planId));
    serve.write(addPlan, (scope, { body }) => addOne(scope, body));
    serve.write(dropPlan, (scope, { params, body }) => drop(scope, params.planId, body.version));
    serve.write(carryOutPlan, (scope, { params, body }) => carryOut(scope, params.planId, body));
  },
};
