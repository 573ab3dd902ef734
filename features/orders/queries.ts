import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { listBroods } from '@/shared/broods/contract';
import { readBooks } from '@/shared/orders/books';
import { listBuyerNames } from '@/shared/orders/buyerNames';
import { listOrders, previewLetter, readOrder, readTerms } from '@/shared/orders/contract';
import type { LetterKind } from '@/shared/orders/letterKinds';

export const ordersQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'orders'],
    queryFn: ({ signal }) => call(listOrders, { params: { roomId }, query: {}, signal }),
    select: ({ orders }) => orders,
  });

export const orderQuery = (roomId: string, orderId: string) =>
  queryOptions({
    queryKey: [roomId, 'order', orderId],
    queryFn: ({ signal }) => call(readOrder, { params: { roomId, orderId }, signal }),
  });

export const buyerNamesQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'buyerNames'],
    queryFn: ({ signal }) => call(listBuyerNames, { params: { roomId }, signal }),
    select: ({ buyers }) => buyers,
  });

/** Broods with fish to sell. */
export const broodsToSellQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'broodsToSell'],
    queryFn: ({ signal }) => call(listBroods, { params: { roomId }, query: { which: 'here' }, signal }),
    select: ({ broods }) => broods.filter(({ available }) => available > 0),
  });

export const termsQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'orderTerms'],
    queryFn: ({ signal }) => call(readTerms, { params: { roomId }, signal }),
  });

export const booksQuery = (roomId: string, year: string) =>
  queryOptions({
    queryKey: [roomId, 'books', year],
    queryFn: ({ signal }) => call(readBooks, { params: { roomId }, query: year ? { year } : {}, signal }),
  });

export const letterQuery = (roomId: string, orderId: string, kind: LetterKind) =>
  queryOptions({
    queryKey: [roomId, 'orderLetter', orderId, kind],
    queryFn: ({ signal }) => call(previewLetter, { params: { roomId, orderId }, query: { kind }, signal }),
  });

/** Runs a write and refreshes the fishroom: orders touch broods, Today and the books alike. */
export function useAct() {
  const { id: roomId } = useRoom();
  const cache = useQueryClient();
  return useMutation({
    mutationFn: (job: () => Promise<unknown>) => job(),
    onSettled: () => cache.invalidateQueries({ queryKey: [roomId] }),
  });
}
