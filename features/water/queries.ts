import { useQuery } from '@tanstack/react-query';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import type { SpeciesProfile } from '@/shared/species/profile';
import { profilesIn } from '@/shared/species/profilesIn';
import { readToday } from '@/shared/today/contract';
import type { TankToday, TodayFacts } from '@/shared/today/facts';

/** What is known of the room today: each tank's last readings, its species as they are judged, what runs in it. */
export function useTodayFacts() {
  const { id: roomId } = useRoom();
  return useQuery({
    queryKey: [roomId, 'today'],
    queryFn: ({ signal }) => call(readToday, { params: { roomId }, signal }),
  });
}

export type TankWater = { now: TankToday | null; profiles: SpeciesProfile[]; care: TodayFacts['care'] };

/** A tank's water so far, and the species that it has to suit. */
export function waterOf(facts: TodayFacts | undefined, tankId: string): TankWater {
  const now = facts?.tanks.find(({ id }) => id === tankId) ?? null;
  const all = facts ? profilesIn(facts.species) : new Map<string, SpeciesProfile>();
  return {
    now,
    profiles: now?.speciesIds.flatMap((id) => all.get(id) ?? []) ?? [],
    care: facts?.care.filter((care) => care.tankId === tankId) ?? [],
  };
}
