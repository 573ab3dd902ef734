import type { Thing } from '@/shared/search/contract';

type Look = {
  /** The part of the address below the fishroom. */
  folder: 'tanks' | 'colonies' | 'broods' | 'fish' | 'strains' | 'orders' | 'sheets' | 'species';
  word: string;
  /** Said of one that is no longer here. */
  gone: string;
};

export const LOOKS: Record<Thing, Look> = {
  tank: { folder: 'tanks', word: 'tank', gone: 'tank, not in use' },
  colony: { folder: 'colonies', word: 'colony', gone: 'colony, ended' },
  brood: { folder: 'broods', word: 'brood', gone: 'brood' },
  fish: { folder: 'fish', word: 'fish', gone: 'fish, no longer here' },
  strain: { folder: 'strains', word: 'strain', gone: 'strain, no longer kept' },
  order: { folder: 'orders', word: 'order', gone: 'order, closed' },
  sheet: { folder: 'sheets', word: 'lineage sheet', gone: 'lineage sheet, not valid' },
  species: { folder: 'species', word: 'species', gone: 'species' },
};
