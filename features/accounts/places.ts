import type { Place, PlaceName } from '@/components/ui/place';
import { may, type Role } from '@/shared/roles';

/** Which place an address below the fishroom belongs to. */
const PLACE_OF: Record<string, PlaceName> = {
  tasks: 'today',
  stock: 'stock',
  colonies: 'stock',
  broods: 'stock',
  tanks: 'stock',
  fish: 'stock',
  holds: 'stock',
  strains: 'stock',
  species: 'stock',
  lots: 'stock',
  lineage: 'lineage',
  pairing: 'lineage',
  sheets: 'lineage',
  buyers: 'buyers',
  orders: 'buyers',
};

/**
 * The place and sub-place of an address such as /r/<id>/broods/<id>. `bare`: a Record form, which fills the phone without
 * the strip and the bottom bar.
 */
export function placeOf(pathname: string): { place: PlaceName | null; sub: string | null; bare: boolean } {
  const [, , , first, second] = pathname.split('/');
  if (!first) return { place: 'today', sub: null, bare: false };
  return {
    place: PLACE_OF[first] ?? null,
    sub: (first === 'stock' || first === 'buyers' ? second : first) ?? null,
    bare: first === 'record',
  };
}

const SUB_PLACES = [
  ['colonies', 'Colonies'],
  ['broods', 'Broods'],
  ['tanks', 'Tanks'],
  ['fish', 'Fish'],
  ['strains', 'Strains'],
] as const;

/** The places a role has: buyers are the owner's, and those keepers' who catch for them. */
export function placesOf(roomId: string, role: Role): Place[] {
  const home = `/r/${roomId}` as const;
  const places: Place[] = [
    { name: 'today', href: home },
    {
      name: 'stock',
      href: `${home}/stock`,
      subPlaces: SUB_PLACES.map(([name, word]) => ({ name, word, href: `${home}/stock/${name}` })),
    },
    { name: 'lineage', href: `${home}/lineage` },
  ];
  if (may(role, 'buyer:see') || may(role, 'catch:see'))
    places.push({
      name: 'buyers',
      href: `${home}/buyers`,
      subPlaces: [
        ...(may(role, 'buyer:see')
          ? [{ name: 'requests', word: 'Requests', href: `${home}/buyers/requests` as const }]
          : []),
        { name: 'orders', word: 'Orders', href: `${home}/buyers/orders` },
        { name: 'availability', word: 'Availability', href: `${home}/buyers/availability` },
        ...(may(role, 'buyer:see')
          ? [{ name: 'waiting', word: 'Waiting list', href: `${home}/buyers/waiting` as const }]
          : []),
      ],
    });
  return places;
}
