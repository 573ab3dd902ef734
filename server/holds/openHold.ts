import { dayWords } from '../../shared/days';
import { OUTCOME_WORDS } from '../../shared/holds/entries';
import { Refusal } from '../../shared/refusal';
import { mustBeOurs } from '../fish';
import type { Scope } from '../scope';
import { clashOf } from './clash';
import { oneHold } from './holds';

/**
 * A hold that goes on, for what is recorded about it on a day. `ended: 'before'` lets what was seen before its end arrive
 * after it, as from a phone that had no signal.
 */
export async function openHold(scope: Scope, holdId: string, onDay: string, ended: 'never' | 'before' = 'never') {
  await mustBeOurs(scope, 'hold', holdId, 'holdId', 'Choose a hold');
  const hold = await oneHold(scope, holdId);
  const late = hold.endedOn !== null && !(ended === 'before' && onDay <= hold.endedOn);
  if (hold.outcome && hold.endedOn && late) {
    throw new Refusal(
      'conflict',
      `This hold has ended: ${OUTCOME_WORDS[hold.outcome].toLowerCase()} ${dayWords(hold.endedOn, scope.today)}`,
      {},
      { current: await clashOf(scope, holdId) },
    );
  }
  if (onDay < hold.spawnEarliest)
    throw new Refusal('invalid', 'That is before the spawn', { onDay: `Not before ${hold.spawnEarliest}` });
  return hold;
}

export const aboutHold = (hold: Awaited<ReturnType<typeof oneHold>>) => [
  { thing: 'hold' as const, id: hold.id },
  { thing: 'tank' as const, id: hold.tank.id },
  ...(hold.colony ? [{ thing: 'colony' as const, id: hold.colony.id }] : []),
  ...(hold.holder ? [{ thing: 'fish' as const, id: hold.holder.id }] : []),
];
