import type { Option } from '@/components/form/Select';
import type { SpeciesSet } from '@/shared/species/contract';
import { LIBRARY } from '@/shared/species/library';

/** The library's species and the fishroom's own, by name. */
export function speciesOptions(set: readonly SpeciesSet[]): Option[] {
  const library = LIBRARY.map(({ id, name, commonNames }) => ({
    value: id,
    word: name,
    italic: true,
    ...(commonNames ? { note: commonNames.value.join(', ') } : {}),
  }));
  const own = set
    .filter((one) => one.own)
    .map(({ id, scientificName }) => ({ value: id, word: scientificName ?? '', italic: true, note: 'Your own' }));
  return [...own, ...library].sort((a, b) => a.word.localeCompare(b.word, 'en'));
}
