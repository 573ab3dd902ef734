import { type Day, daysBetween } from '../days';
import type { TaskRow } from './facts';

export const DUE_KINDS = [
  'holdCheck',
  'stripWindow',
  'release',
  'stageCount',
  'headCount',
  'lengthSample',
  'waterTest',
  'waterChange',
  'treatmentEnd',
  'quarantineEnd',
  'collection',
  'reservationEnds',
  'answer',
  'own',
] as const;
export type DueKind = (typeof DUE_KINDS)[number];

/** Something that is due. `key` names it for decisions; `lateDays` is below zero while it is still ahead. */
export type Due = {
  key: string;
  kind: DueKind;
  thing: 'hold' | 'batch' | 'tank' | 'task' | 'order' | 'request';
  id: string;
  code: string;
  dueOn: Day;
  /** Last day of a window that begins on `dueOn`: until then it is not late. */
  untilOn: Day | null;
  lateDays: number;
  /** When it was last done; null: never. */
  lastOn: Day | null;
  heads: number | null;
  tankCode: string | null;
  /** Fish to measure, or percentage to change. */
  amount: number | null;
  title: string | null;
  assignedTo: TaskRow['assignedTo'];
  /** It was put off: the day on which it first was due. */
  putOffFrom: Day | null;
  /** The fishroom's own task, as it is stored; null of one that is worked out. */
  own: TaskRow | null;
};

type Facts = Pick<Due, 'kind' | 'thing' | 'id' | 'code' | 'dueOn'> &
  Partial<Due> & {
    /** What the key names where it is not the thing: one treatment of a tank that has several. */
    subject?: string;
  };

/** A key names the occasion, not only the thing: what was done for one date does not hide the next. */
export const due = ({ subject, ...facts }: Facts, today: Day): Due => ({
  lastOn: null,
  heads: null,
  tankCode: null,
  amount: null,
  title: null,
  assignedTo: null,
  putOffFrom: null,
  untilOn: null,
  own: null,
  ...facts,
  key: facts.kind === 'own' ? `own:${facts.id}` : `${facts.kind}:${subject ?? facts.id}:${facts.dueOn}`,
  lateDays: lateDaysOf({ untilOn: null, ...facts }, today),
});

/** Days after its time; 0 from the day it is due to the end of its window, below zero before. */
export function lateDaysOf({ dueOn, untilOn }: Pick<Due, 'dueOn' | 'untilOn'>, today: Day): number {
  const since = daysBetween(dueOn, today);
  return since <= 0 || untilOn === null ? since : Math.max(0, daysBetween(untilOn, today));
}

const KEY = new RegExp(`^(?:${DUE_KINDS.join('|')}):[0-9a-f-]{36}:\\d{4}-\\d{2}-\\d{2}$`);

/** Whether the text can be the key of a task that is worked out. */
export const isDueKey = (text: string): boolean => KEY.test(text) && !text.startsWith('own:');
