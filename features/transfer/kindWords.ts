import type { ImportKind } from '@/shared/transfer/importFields';

export const KIND_WORDS: Record<ImportKind, { word: string; note: string }> = {
  tanks: { word: 'Tanks', note: 'One line a tank' },
  fish: { word: 'Fish', note: 'One line a fish; its strain is here already' },
  colonies: { word: 'Colonies', note: 'One line a colony' },
  holds: { word: 'Holds', note: 'Holds that brought no fry' },
  broods: { word: 'Broods', note: 'One line a brood, counts in columns by month' },
  counts: { word: 'Head counts', note: 'One line a count of a brood' },
  samples: { word: 'Length samples', note: 'One line a day, its lengths in one cell' },
};
