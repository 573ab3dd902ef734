import { useGlobalSearchParams, useRouter } from 'expo-router';

/** A word kept in the address's query: order, filter and search of a list survive a reload and can be shared. */
export function useUrlWord<Word extends string>(
  key: string,
  otherwise: Word,
  allowed?: readonly Word[],
): [Word, (word: Word) => void] {
  const router = useRouter();
  const raw = useGlobalSearchParams()[key];
  const text = typeof raw === 'string' ? raw : undefined;
  const known = allowed ? allowed.find((word) => word === text) : text;
  // Without a list of words any text is one.
  const word = (known ?? otherwise) as Word;
  return [word, (next) => router.setParams({ [key]: next === otherwise ? undefined : next })];
}
