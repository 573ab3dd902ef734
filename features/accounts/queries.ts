import { type QueryClient, queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { forgetAnswers, keepFor } from '@/features/call/keptAnswers';
import { forgetLarge } from '@/features/call/large';
import { forgetWaiting } from '@/features/entries';
import { getMe, type Me, signOut } from '@/shared/accounts/contract';
import { Refusal } from '@/shared/refusal';

export const isSignedOut = (error: unknown): boolean => error instanceof Refusal && error.reason === 'signed-out';

/** Who is signed in on this device; null when nobody is. */
export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async ({ signal }): Promise<Me | null> => {
    try {
      const me = await call(getMe, { signal });
      keepFor(me.account.id);
      return me;
    } catch (error) {
      if (!isSignedOut(error)) throw error;
      keepFor(null);
      return null;
    }
  },
  staleTime: 60_000,
  refetchInterval: 10 * 60_000,
});

/** Only below a gate that has asked for it. */
export function useMe(): Me {
  const { data } = useQuery(meQuery);
  if (!data) throw new Error('useMe without a session');
  return data;
}

/** Asks again who is signed in: after a sign-in, and after anything that changed the account or its fishrooms. */
export function useAskAgain() {
  const cache = useQueryClient();
  return () => cache.invalidateQueries({ queryKey: meQuery.queryKey });
}

export function useSignOut() {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: () => call(signOut),
    onSuccess: async () => {
      await forgetWaiting();
      forgetLarge();
      await forgetAnswers();
      cache.setQueryData(meQuery.queryKey, null);
      forgetFetched(cache);
    },
  });
}

/** Everything that was fetched for whoever was signed in: the next person at this device must not see it. */
export function forgetFetched(cache: QueryClient): void {
  const kept = ['me', 'invitation'];
  cache.removeQueries({ predicate: ({ queryKey }) => !kept.includes(String(queryKey[0])) });
}
