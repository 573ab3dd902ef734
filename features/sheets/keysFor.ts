import type { FoundKeys } from '@/shared/sheets/checkSheet';
import { readKeySet } from '@/shared/sheets/sheetFile';

/** The published keys behind an address; what cannot be reached has to be pasted. */
export async function keysFor(keysAt: string | null): Promise<FoundKeys> {
  if (!keysAt) throw new Error('This file does not say where its keys are. Paste the fishroom’s keys.');
  const answer = await fetch(keysAt, { credentials: 'omit' }).catch(() => null);
  const keys = answer?.ok ? readKeySet(await answer.json().catch(() => null)) : null;
  if (!keys) throw new Error(`The keys at ${keysAt} could not be fetched. Paste the fishroom’s keys instead.`);
  return { keys, at: keysAt };
}
