import type { ReactNode } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';

type Props = {
  state: {
    error: Error | null;
    isPending: boolean;
    hasNextPage: boolean;
    isFetchingNextPage: boolean;
    fetchNextPage: () => unknown;
    refetch: () => unknown;
  };
  isEmpty: boolean;
  emptyTitle: string;
  emptyWords: string;
  children: ReactNode;
};

/** A long list that is fetched a page at a time, newest first. */
export function Paged({ state, isEmpty, emptyTitle, emptyWords, children }: Props) {
  if (state.isPending) return <Loading />;
  if (state.error && isEmpty)
    return <ErrorState title="Not loaded" words={state.error.message} onRetry={() => void state.refetch()} />;
  if (isEmpty) return <EmptyState small title={emptyTitle} words={emptyWords} />;
  return (
    <>
      {children}
      {state.hasNextPage ? (
        <View style={{ marginTop: space[5] }}>
          <Button
            label="Show earlier ones"
            busy={state.isFetchingNextPage}
            busyLabel="Loading"
            onPress={() => void state.fetchNextPage()}
          />
        </View>
      ) : null}
    </>
  );
}
