import type { Href } from 'expo-router';
import type { IconName } from './iconMarks';

/** A place of the fishroom. Record is not one: it is the action in their middle. */
export type PlaceName = 'today' | 'stock' | 'lineage' | 'buyers';

export type SubPlace = { name: string; word: string; href: Href };

export type Place = {
  name: PlaceName;
  href: Href;
  /** What waits there, told beside its name on wide screens. */
  count?: number;
  /** Shown in the rail while the place is current. */
  subPlaces?: SubPlace[];
};

export const placeWords: Record<PlaceName, string> = {
  today: 'Today',
  stock: 'Stock',
  lineage: 'Lineage',
  buyers: 'Buyers',
};

export const placeIcons: Record<PlaceName, IconName> = {
  today: 'today',
  stock: 'stock',
  lineage: 'lineage',
  buyers: 'buyers',
};
