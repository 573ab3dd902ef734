import { queryOptions } from '@tanstack/react-query';
import { addressOf, call } from '@/features/call';
import { AvailablePage, readAvailable, showAvailablePhoto } from '@/shared/buyers/available';

export const availableQuery = (slug: string) =>
  queryOptions({
    queryKey: ['available', slug],
    queryFn: ({ signal }) => call(readAvailable, { params: { slug }, signal }),
    initialData: () => sentWithPage(slug),
  });

/** The page came with its fish in it: no second question for the same. */
function sentWithPage(slug: string): AvailablePage | undefined {
  const text = globalThis.document?.getElementById('available')?.textContent;
  if (!text) return undefined;
  const page = AvailablePage.safeParse(JSON.parse(text));
  return page.success && page.data.slug === slug ? page.data : undefined;
}

export const publicPhoto = (slug: string, photoId: string, size: 'small' | 'large'): string =>
  addressOf(showAvailablePhoto, { params: { slug, photoId, size } });
