import type { HoldRow } from '@/shared/holds/contract';
import { modeWords } from './modeWords';

/** "DUMA-A04", or "1 of 9 females" where one can’t tell which. */
export function whoHolds({ holder, femalesInColony, mode }: HoldRow): string {
  if (holder?.code) return holder.code;
  const { carer } = modeWords(mode);
  return carer === 'female' && femalesInColony > 1 ? `1 of ${femalesInColony} females` : `A ${carer}`;
}
