import * as z from 'zod/mini';
import { ColonyCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line, Note, Version } from '../shapes';

const Few = z.array(Id).check(z.minLength(1, 'At least one'), z.maxLength(60, 'At most sixty'));

/** Fish that will live in one tank: every male with every female counts. */
const PlannedGroup = z.strictObject({ tankId: z.nullable(Id), males: Few, females: Few });
export type PlannedGroup = z.output<typeof PlannedGroup>;

const eachOnce = (groups: PlannedGroup[]): boolean => {
  const ids = groups.flatMap(({ males, females }) => [...males, ...females]);
  return new Set(ids).size === ids.length;
};

export const PlanContent = z.strictObject({
  strainId: Id,
  /** One group, or two where all cannot live together. */
  groups: z
    .array(PlannedGroup)
    .check(
      z.minLength(1, 'Choose fish'),
      z.maxLength(2, 'At most two tanks'),
      z.refine(eachOnce, 'A fish can be in one tank only'),
    ),
  /** The highest expected F of the fry that the plan was made under. */
  limit: z.number('Type a limit').check(z.minimum(0, 'From 0'), z.maximum(1, 'At most 1')),
  note: Note,
});
export type PlanContent = z.output<typeof PlanContent>;

export const PLAN_STATES = ['draft', 'carriedOut', 'dropped'] as const;

export const PlanRow = z.strictObject({
  id: Id,
  version: Version,
  name: line(80, 'Give the plan a name'),
  content: PlanContent,
  state: z.enum(PLAN_STATES),
  colony: z.nullable(z.strictObject({ id: Id, code: z.string() })),
  by: z.string(),
  createdAt: z.string(),
  /** Planned fish that died or left meanwhile, by code. */
  gone: z.array(z.strictObject({ id: Id, code: z.nullable(z.string()) })),
});
export type PlanRow = z.output<typeof PlanRow>;

export const listPlans = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/plans',
  needs: 'lineage:see',
  params: inRoom({}),
  output: z.strictObject({ plans: z.array(PlanRow) }),
});

export const readPlan = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/plans/:planId',
  needs: 'lineage:see',
  params: inRoom({ planId: Id }),
  output: PlanRow,
});

export const addPlan = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/plans',
  needs: 'plan:write',
  params: inRoom({}),
  body: z.strictObject({ id: Id, name: line(80, 'Give the plan a name'), content: PlanContent }),
  output: PlanRow,
});

export const dropPlan = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/plans/:planId/drop',
  needs: 'plan:write',
  params: inRoom({ planId: Id }),
  body: z.strictObject({ version: Version }),
  output: PlanRow,
});

/** Starts a colony for each group, its fish members of it from that day, and a task for each tank that fish are netted from. */
export const carryOutPlan = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/plans/:planId/carry-out',
  needs: 'plan:write',
  params: inRoom({ planId: Id }),
  body: z.strictObject({
    version: Version,
    onDay: DayText,
    colonies: z
      .array(z.strictObject({ id: Id, code: ColonyCode, tankId: Id }))
      .check(z.minLength(1, 'Name the colony'), z.maxLength(2, 'At most two')),
  }),
  output: PlanRow,
});
