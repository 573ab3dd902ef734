import { queryOptions } from '@tanstack/react-query';
import { call } from '@/features/call';
import { listBroods } from '@/shared/broods/contract';
import { listColonies } from '@/shared/colonies/contract';
import { listFish } from '@/shared/fish/contract';
import { listStrains } from '@/shared/strains/contract';
import { listTanks } from '@/shared/tanks/contract';

/** Everything that lives here, for the counts of the first page and one search over all of it. */
export const stockQuery = (roomId: string) =>
  queryOptions({
    queryKey: [roomId, 'stock'],
    queryFn: async ({ signal }) => {
      const sent = { params: { roomId }, signal };
      const [{ colonies }, { broods }, { tanks }, { fish }, { strains }] = await Promise.all([
        call(listColonies, sent),
        call(listBroods, sent),
        call(listTanks, sent),
        call(listFish, sent),
        call(listStrains, sent),
      ]);
      return {
        colonies: colonies.filter(({ endedOn }) => endedOn === null),
        broods,
        tanks: tanks.filter(({ retiredOn }) => retiredOn === null),
        fish: fish.filter(({ code }) => code !== null),
        strains,
      };
    },
  });
