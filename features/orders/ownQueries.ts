import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import {
  cancelOwnOrder,
  listOwnOrders,
  type OwnOrder,
  payOwnOrder,
  pickOwnTime,
  readOwnOrder,
  writeOwnMessage,
} from '@/shared/orders/own';

const keyOf = (token: string) => ['ownOrder', token];

export const ownOrderQuery = (token: string) =>
  queryOptions({
    queryKey: keyOf(token),
    queryFn: ({ signal }) => call(readOwnOrder, { params: { token }, signal }),
  });

export const ownOrdersQuery = () =>
  queryOptions({
    queryKey: ['ownOrders'],
    queryFn: ({ signal }) => call(listOwnOrders, { signal }),
    select: ({ orders }) => orders,
  });

/** What the buyer does answers the order as it then stands: it takes the place of the one on the screen. */
function useStep<Body>(token: string, step: (body: Body) => Promise<OwnOrder>) {
  const cache = useQueryClient();
  return useMutation({ mutationFn: step, onSuccess: (order) => cache.setQueryData(keyOf(token), order) });
}

export const usePickTime = (token: string) =>
  useStep(token, (time: string) => call(pickOwnTime, { params: { token }, body: { time } }));

export const useWrite = (token: string) =>
  useStep(token, (body: { id: string; body: string }) => call(writeOwnMessage, { params: { token }, body }));

export const useCancelOwn = (token: string) =>
  useStep(token, (because: string) => call(cancelOwnOrder, { params: { token }, body: { because } }));

export function usePay(token: string) {
  return useMutation({
    mutationFn: async () => {
      const { url } = await call(payOwnOrder, { params: { token } });
      globalThis.location.assign(url);
    },
  });
}
