import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '@/components/ui/Button';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import type { AvailablePage } from '@/shared/buyers/available';
import { AskFishForm } from './AskFishForm';
import { AskNoticeForm } from './AskNoticeForm';
import { availableQuery } from './publicQueries';

type Props = { slug: string; broodId?: string | undefined; strainId?: string | undefined };

/** A visitor asks for fish of a brood, or to be told when a strain has reached a length. */
export function AskScreen({ slug, broodId, strainId }: Props) {
  const { data, error, refetch } = useQuery(availableQuery(slug));
  const [sentTo, setSentTo] = useState<string | null>(null);
  if (sentTo) return <Sent slug={slug} to={sentTo} />;
  return (
    <Screen title={broodId ? 'Ask for fish' : 'Tell me when'} back={`/available/${slug}`} measure>
      {data ? (
        <Asking page={data} broodId={broodId} strainId={strainId} onSent={setSentTo} />
      ) : error ? (
        <ErrorState title="The page could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading" rows={4} />
      )}
    </Screen>
  );
}

type AskingProps = Omit<Props, 'slug'> & { page: AvailablePage; onSent: (to: string) => void };

function Asking({ page, broodId, strainId, onSent }: AskingProps) {
  const fish = page.fish.find((one) => one.broodId === broodId);
  const strain = page.strains.find(({ id }) => id === strainId);
  if (fish) return <AskFishForm slug={page.slug} fish={fish} onSent={onSent} />;
  if (strain) return <AskNoticeForm slug={page.slug} strain={strain} onSent={onSent} />;
  return (
    <EmptyState title="Those fish are not on the page any more" words="Others may be.">
      <Button label={`Fish of ${page.name}`} href={`/available/${page.slug}`} />
    </EmptyState>
  );
}

function Sent({ slug, to }: { slug: string; to: string }) {
  return (
    <Screen title="Now look for the letter" measure>
      <EmptyState
        title={`A letter is on its way to ${to}`}
        words="Open it and confirm within three days: then your request stands in the row. If it does not come, look where your mail program puts what it does not trust."
      >
        <Button label="Back to the fish" href={`/available/${slug}`} />
      </EmptyState>
    </Screen>
  );
}
