import { MutationCache, QueryCache, QueryClient, QueryClientProvider, replaceEqualDeep } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import { ThemeProvider } from '@/components/theme/ThemeProvider';
import { Unreachable } from '@/features/call';
import { keptAnswers } from '@/features/call/keptAnswers';
import { onLateAnswer } from '@/features/call/large';
import { isReadLarge } from '@/features/call/largeLines';
import { isSignedOut, meQuery } from './queries';

/** Everything that stands round every page: the theme, and what was fetched. */
export function AppRoot({ children }: { children: ReactNode }) {
  const [cache] = useState(newCache);
  return (
    <QueryClientProvider client={cache}>
      <ThemeProvider>{children}</ThemeProvider>
    </QueryClientProvider>
  );
}

function newCache(): QueryClient {
  // A session that ended while a page was open: the gate above the page is told, and asks to sign in.
  const tellGate = (error: unknown) => {
    if (isSignedOut(error)) void cache.invalidateQueries({ queryKey: meQuery.queryKey });
  };
  const cache: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError: tellGate }),
    mutationCache: new MutationCache({ onError: tellGate }),
    defaultOptions: {
      queries: {
        staleTime: 30_000,
        // A refusal stays a refusal; only a bad line is worth another try.
        retry: (failures, error) => error instanceof Unreachable && failures < 2 && navigator.onLine,
        networkMode: 'always',
        refetchOnReconnect: true,
        persister: keptAnswers,
        structuralSharing: (before, now) => (isReadLarge(now) ? now : replaceEqualDeep(before, now)),
      },
      mutations: { networkMode: 'always' },
    },
  });
  onLateAnswer(() => void cache.invalidateQueries({ predicate: ({ state }) => isReadLarge(state.data) }));
  return cache;
}
