import { useQuery, useQueryClient } from '@tanstack/react-query';
import { type Href, useRouter } from 'expo-router';
import type * as z from 'zod/mini';
import { call } from '@/features/call';
import { type SignIn, type SignUp, signIn, signUp } from '@/shared/accounts/contract';
import { signInByLink } from '@/shared/accounts/links';
import { passSecondStep, type SecondStep } from '@/shared/accounts/security';
import { nextPage } from './nextPage';
import { forgetFetched, meQuery } from './queries';

/** Where somebody who is signed in already is sent on to; null for whoever is not, or while it is being asked. */
export function useAlreadyIn(next: string | undefined): Href | null {
  const { data: me } = useQuery(meQuery);
  return me ? nextPage(next) : null;
}

/** What the door does, each going on to the next page once the person is in. */
export function useDoor(next: string | undefined) {
  const cache = useQueryClient();
  const router = useRouter();
  const goIn = async () => {
    forgetFetched(cache);
    await cache.fetchQuery({ ...meQuery, staleTime: 0 });
    router.replace(nextPage(next));
  };
  const orSecondStep = async ({ secondStep }: { secondStep: boolean }) => {
    if (!secondStep) await goIn();
    return secondStep;
  };
  return {
    /** True when a code of the authenticator is wanted as well. */
    byPassword: async (body: z.output<typeof SignIn>) => orSecondStep(await call(signIn, { body })),
    byLink: async (token: string) => orSecondStep(await call(signInByLink, { body: { token } })),
    byCode: async (body: z.output<typeof SecondStep>) => {
      await call(passSecondStep, { body });
      await goIn();
    },
    signUp: async (body: z.output<typeof SignUp>) => {
      await call(signUp, { body });
      await goIn();
    },
  };
}
