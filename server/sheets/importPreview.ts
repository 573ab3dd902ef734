import { FishCode, proposeStrainCode } from '../../shared/codes';
import { type AncestryEntry, splitAnimalId } from '../../shared/sheets/ancestry';
import type { SheetContent } from '../../shared/sheets/content';
import type { ImportPreview } from '../../shared/sheets/importContract';
import { generationWords } from '../../shared/sheets/sayings';
import { LIBRARY } from '../../shared/species/library';
import { freeCodes } from '../fish';
import type { Scope } from '../scope';
import { strainRows } from '../strains';
import type { ImportPlan } from './importPlan';
import type { SheetRead } from './readSource';

/** The plan in the words of the contract, with what the keeper is asked for. */
export async function toldPlan(scope: Scope, read: SheetRead, plan: ImportPlan): Promise<ImportPreview> {
  const { content, trust, recalled } = read;
  const strains = await fittingStrains(scope, content);
  return {
    content,
    trust,
    recalled: recalled && { state: recalled.state, on: recalled.on },
    animals: plan.animals
      .filter(({ entry }) => entry.id !== content.subject.id)
      .map(({ entry, fate, fishId }) => ({
        id: entry.id,
        code: entry.code,
        sex: entry.sex,
        room: entry.room ?? roomOf(scope, content, entry),
        origin: entry.origin,
        generation: entry.generation && generationWords(entry.generation),
        fate,
        fishId,
      })),
    heads: plan.heads,
    taken: plan.same?.heads ?? 0,
    before: plan.before.map(({ number, heads, on }) => ({ number, heads, on })),
    strains: strains.map(({ id }) => id),
    newStrain: await newStrainFor(scope, content),
    code: content.subject.kind === 'fish' ? await freeCode(scope, content.subject.code) : null,
    refused: plan.refused,
  };
}

function roomOf(scope: Scope, { fishroom }: SheetContent, { id }: AncestryEntry): string | null {
  const namedBy = splitAnimalId(id)?.roomId;
  if (namedBy === scope.roomId) return 'this fishroom';
  return namedBy === fishroom.id ? fishroom.name : null;
}

const folded = (text: string | null): string => (text ?? '').trim().toLowerCase();

/** The strains here of the same species and place. */
async function fittingStrains(scope: Scope, { strain }: SheetContent) {
  if (strain.claim !== 'strain') return [];
  const place = strain.locality.known === 'unknown' ? null : strain.locality.name;
  const rows = await strainRows(scope);
  return rows.filter(
    ({ displayName, locality, retiredOn }) =>
      !retiredOn && folded(displayName) === folded(strain.scientific) && folded(locality) === folded(place),
  );
}

export async function newStrainFor(scope: Scope, { strain }: SheetContent): Promise<ImportPreview['newStrain']> {
  if (strain.claim !== 'strain') return null;
  const species = LIBRARY.find(({ name }) => folded(name) === folded(strain.scientific));
  if (!species) return null;
  const taken = new Set((await strainRows(scope)).map(({ code }) => code));
  const place = strain.locality.known === 'unknown' ? null : strain.locality.name;
  const own = strain.code.toUpperCase();
  const code = /^[A-Z0-9]{2,12}$/.test(own) && !taken.has(own) ? own : proposeStrainCode(species.name, place, taken);
  return { code, speciesId: species.id, name: [species.name, place].filter(Boolean).join(', ') };
}

/** The code that the fish has on its sheet where it is free here, else the next after it. */
async function freeCode(scope: Scope, wanted: string): Promise<string | null> {
  const code = FishCode.safeParse(wanted);
  if (!code.success) return null;
  const taken = await scope.db
    .selectFrom('fish')
    .where('roomId', '=', scope.roomId)
    .where('code', '=', code.data)
    .select('id')
    .executeTakeFirst();
  if (!taken) return code.data;
  const [next = null] = await freeCodes(scope, code.data.replace(/-?\d+$/, '').slice(0, 18), 1);
  return next;
}
