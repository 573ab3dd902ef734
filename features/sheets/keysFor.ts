import { call } from '@/features/call';
import type { FoundKeys } from '@/shared/sheets/checkSheet';
import { fetchKeys } from '@/shared/sheets/contract';
import { parsed, type Recalled, readKeySet, readRecalled } from '@/shared/sheets/sheetFile';

export type KeysFound = { found: FoundKeys; recalled: Recalled[] };

/** The published keys behind an address, fetched by our server; what cannot be reached has to be pasted. */
export async function keysFor(keysAt: string | null): Promise<KeysFound> {
  if (!keysAt) throw new Error('This file does not say where its keys are. Paste the fishroom’s keys.');
  const { keys, recalled } = await call(fetchKeys, { body: { at: keysAt } });
  return { found: { keys, at: keysAt }, recalled };
}

/** Keys that a person got from the fishroom and vouches for. */
export function pastedKeys(text: string): KeysFound {
  const value = parsed(text);
  const keys = readKeySet(value);
  if (!keys) throw new Error('What you pasted is not a set of keys: it begins with {"keys": […');
  return { found: { keys, at: null }, recalled: readRecalled(value) };
}
