import { queryOptions, useQuery } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { byNumber } from '@/shared/codes';
import { listTanks, type TankRow } from '@/shared/tanks/contract';

const tanksQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'record', 'tanks'],
    queryFn: ({ signal }) => call(listTanks, { params: { roomId }, signal }),
    select: ({ tanks }) =>
      tanks
        .filter(({ retiredOn }) => retiredOn === null)
        .sort((a, b) => a.walkOrder - b.walkOrder || byNumber(a.code, b.code)),
  });

/** The tanks in use, in the order in which they are walked by. */
export function useTanks() {
  const { id: roomId } = useRoom();
  return useQuery(tanksQuery(roomId));
}

/** Single fish up to so many are named. */
const MOST_NAMED = 2;

/** "DUMA-A, 8 fish", "DUMA-26C, 29 heads", "empty": who lives in a tank, in a few words. */
export function residentsWords({ residents }: TankRow): string {
  if (residents.length === 0) return 'empty';
  const single = residents.filter(({ thing }) => thing === 'fish');
  const many = single.length > MOST_NAMED;
  const order = { colony: 0, batch: 1, fish: 2 };
  const words = residents
    .filter(({ thing }) => thing !== 'fish' || !many)
    .toSorted((a, b) => order[a.thing] - order[b.thing])
    .map(({ thing, code, heads }) => {
      if (thing === 'colony') return `${code}, ${heads} fish`;
      return thing === 'batch' && heads > 0 ? `${code}, ${heads} heads` : code;
    });
  return [...words, ...(many ? [`${single.length} single fish`] : [])].join(' · ');
}
