import { dayWords } from '../../shared/days';
import { OUTCOME_WORDS } from '../../shared/holds/entries';
import { Refusal } from '../../shared/refusal';
import { mustBeOurs } from '../fish';
import type { Scope } from '../scope';
import { clashOf } from './clash';
import { oneHold } from './holds';

/** A hold that goes on, for what is recorded about it on a day. */
export async function openHold(scope: Scope, holdId: string, onDay: string) {
  await mustBeOurs(scope, 'hold', holdId, 'holdId', 'Choose a hold');
  const hold = await oneHold(scope, holdId);
  if (hold.outcome && hold.endedOn) {
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
