import { Refusal } from '../../shared/refusal';
import type { ImportDraft } from '../../shared/sheets/importContract';
import { newId } from '../db/newId';
import { mustBeOurs } from '../fish';
import type { Scope } from '../scope';
import { addLotTo, addStrainTo } from '../strains';
import type { Taking } from './importedAncestors';
import { newStrainFor } from './importPreview';

const strainWrong = (sentence: string) => new Refusal('invalid', sentence, { strainId: sentence });

/** The strain that the keeper chose, or a new one out of what the sheet claims. */
export async function strainFor(
  scope: Scope,
  { draft, read: { content } }: Taking & { draft: ImportDraft },
): Promise<string> {
  const { strain } = content;
  if (draft.strainId) {
    await mustBeOurs(scope, 'strain', draft.strainId, 'strainId', 'Choose a strain');
    return draft.strainId;
  }
  if (!draft.newStrain || strain.claim !== 'strain') throw strainWrong('Choose a strain');
  const proposed = await newStrainFor(scope, content);
  if (!proposed) throw strainWrong('Its species is not in the library: add the strain first, then choose it');
  const { id, code } = draft.newStrain;
  await addStrainTo(scope, {
    id,
    code,
    speciesId: proposed.speciesId,
    naming: strain.lineBred ? 'lineBred' : strain.naming,
    scientificName: null,
    tradeName: strain.tradeName,
    synonyms: strain.synonyms.join('; ').slice(0, 300) || null,
    locality: strain.locality.known === 'unknown' ? null : strain.locality.name,
    localityKnown: strain.locality.known,
    provenance: 'bredElsewhere',
    fromWhom: content.fishroom.name,
    acquiredOn: draft.receivedOn,
    papers: `Lineage sheet ${content.issue.number}`,
    citesSource: strain.source,
    note: null,
  }).catch(underNewStrain);
  return id;
}

/** A code that is taken is told beside the field that it was typed in. */
function underNewStrain(error: unknown): never {
  if (error instanceof Refusal && error.fields?.['code'])
    throw new Refusal(error.reason, error.message, { 'newStrain.code': error.fields['code'] });
  throw error;
}

/** The fish came in together: a lot of the strain. */
export async function lotFor(scope: Scope, strainId: string, { draft, read }: Taking & { draft: ImportDraft }) {
  const { fishroom, generation, issue, subject, ancestry } = read.content;
  const id = newId(scope.now);
  const wild = ancestry.find((entry) => entry.id === subject.id)?.origin === 'wild';
  await addLotTo(scope, strainId, {
    id,
    receivedOn: draft.receivedOn,
    fromWhom: fishroom.name,
    provenance: wild ? 'wildCaught' : 'bredElsewhere',
    generation: generation && generation.low === generation.high && generation.low <= 50 ? generation.low : null,
    heads: draft.heads,
    deadOnArrival: 0,
    quarantineUntil: draft.quarantineUntil,
    papers: `Lineage sheet ${issue.number}`,
    // Their kinship is known from the sheet.
    mayBeSibs: false,
    note: null,
  });
  return id;
}
