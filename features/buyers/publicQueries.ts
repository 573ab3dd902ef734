import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type * as z from 'zod/mini';
import { addressOf, call } from '@/features/call';
import {
  type AskDraft,
  askForFish,
  confirmRequest,
  readOwnRequest,
  stopNotices,
  withdrawRequest,
} from '@/shared/buyers/ask';
import { AvailablePage, readAvailable, showAvailablePhoto } from '@/shared/buyers/available';
import { Refusal } from '@/shared/refusal';
import { fieldsHere } from './askDraft';

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

export function useAsk(slug: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof AskDraft>) =>
      call(askForFish, { params: { slug }, body }).catch((error: unknown) => {
        throw error instanceof Refusal ? new Refusal(error.reason, error.message, fieldsHere(error.fields)) : error;
      }),
  });
}

const ownKey = (token: string) => ['ownRequest', token];

export const ownRequestQuery = (token: string) =>
  queryOptions({
    queryKey: ownKey(token),
    queryFn: ({ signal }) => call(readOwnRequest, { params: { token }, signal }),
  });

const STEPS = { confirm: confirmRequest, withdraw: withdrawRequest, stop: stopNotices };

/** What the visitor does answers the request as it then stands. */
export function useOwnStep(token: string) {
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (step: keyof typeof STEPS) => call(STEPS[step], { params: { token } }),
    onSuccess: (request) => cache.setQueryData(ownKey(token), request),
  });
}
