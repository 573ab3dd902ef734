import type { Fate, ImportPreview, Trust } from './importContract';

/** How far a sheet that was taken in can be trusted, for the keeper. */
export function trustWords({ signature, keysFrom }: Pick<Trust, 'signature' | 'keysFrom'>): {
  word: string;
  says: string;
} {
  if (signature === 'keyUnknown')
    return { word: 'Not checked', says: 'No key of the fishroom was found: nothing shows who wrote it.' };
  if (keysFrom === 'pasted')
    return { word: 'Checked by pasted keys', says: 'It is what the holder of the pasted keys signed.' };
  if (keysFrom === 'here')
    return { word: 'Checked', says: 'It is what the fishroom signed, by its keys on this installation.' };
  return { word: 'Checked', says: 'It is what the fishroom signed, by the keys that it publishes.' };
}

export const FATE_WORDS: Record<Fate, string> = {
  new: 'New here',
  ours: 'A fish of yours',
  same: 'Known here',
  kept: 'Told otherwise; what is known stays',
  corrected: 'Known here, now told better',
};

/** "3 ancestors: 2 new here, 1 known here already". */
export function ancestorsWords(animals: ImportPreview['animals']): string {
  if (animals.length === 0) return 'No ancestor is known.';
  const fresh = animals.filter(({ fate }) => fate === 'new').length;
  const known = animals.length - fresh;
  const count = animals.length === 1 ? '1 ancestor' : `${animals.length} ancestors`;
  if (known === 0) return `${count}, new here.`;
  if (fresh === 0) return `${count}, known here already: they are not entered twice.`;
  return `${count}: ${fresh} new here, ${known} known already and not entered twice.`;
}
