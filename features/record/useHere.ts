import { useQuery } from '@tanstack/react-query';
import { useGlobalSearchParams, usePathname } from 'expo-router';
import { call } from '@/features/call';
import { useTanks } from '@/features/entries/tanks';
import { useRoom } from '@/hooks/useRoom';
import { listBroods } from '@/shared/broods/contract';
import { listFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import { isId } from '@/shared/ids';
import type { TankRow } from '@/shared/tanks/contract';
import type { FormOf } from './actions';

/** Where Record was opened: the tank, and the thing whose page it was, as the forms take them. */
export type Here = { tank: TankRow | null; ids: Partial<Record<FormOf, string>> };

const THING_OF: Record<string, FormOf> = {
  tanks: 'tank',
  colonies: 'colony',
  holds: 'hold',
  broods: 'brood',
  fish: 'fish',
};

/** The thing that an address is the page of. */
export function thingAt(pathname: string): { thing: FormOf; id: string } | null {
  const [, , , place = '', id = ''] = pathname.split('/');
  const thing = THING_OF[place];
  return thing && isId(id) ? { thing, id } : null;
}

/** The tank that the page is about, however it is about it; `?tank=` says it outright. */
export function useHere(): Here {
  const { data: tanks = [] } = useTanks();
  const at = thingAt(usePathname());
  // A label names its tank, or the colony that may have moved since it was printed.
  const { tank: asked, colony } = useGlobalSearchParams<{ tank?: string; colony?: string }>();
  const ofColony = colony ? tanks.find(({ residents }) => residents.some(({ id }) => id === colony))?.id : null;
  const tankId = useTankOf(at, tanks) ?? asked ?? ofColony ?? null;
  const tank = tanks.find(({ id }) => id === tankId) ?? null;
  return { tank, ids: { ...(tankId ? { tank: tankId } : {}), ...(at ? { [at.thing]: at.id } : {}) } };
}

function useTankOf(at: ReturnType<typeof thingAt>, tanks: TankRow[]): string | null {
  const { id: roomId } = useRoom();
  const params = { roomId };
  const holds = useQuery({
    queryKey: [roomId, 'record', 'holds'],
    queryFn: ({ signal }) => call(listHolds, { params, query: { which: 'all' }, signal }),
    enabled: at?.thing === 'hold',
  });
  const broods = useQuery({
    queryKey: [roomId, 'record', 'broods'],
    queryFn: ({ signal }) => call(listBroods, { params, signal }),
    enabled: at?.thing === 'brood',
  });
  const fish = useQuery({
    queryKey: [roomId, 'record', 'fish'],
    queryFn: ({ signal }) => call(listFish, { params, signal }),
    enabled: at?.thing === 'fish',
  });
  if (at === null) return null;
  switch (at.thing) {
    case 'tank':
      return at.id;
    case 'colony':
      return tanks.find(({ residents }) => residents.some(({ id }) => id === at.id))?.id ?? null;
    case 'hold':
      return holds.data?.holds.find(({ id }) => id === at.id)?.tank.id ?? null;
    case 'brood': {
      // Spread over several tanks it has no one place.
      const [tank, ...others] = broods.data?.broods.find(({ id }) => id === at.id)?.tanks ?? [];
      return others.length === 0 ? (tank?.id ?? null) : null;
    }
    case 'fish':
      return fish.data?.fish.find(({ id }) => id === at.id)?.tank?.id ?? null;
    default:
      return null;
  }
}
