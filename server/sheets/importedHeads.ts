import type { AncestryEntry } from '../../shared/sheets/ancestry';
import type { ImportDraft } from '../../shared/sheets/importContract';
import { newId } from '../db/newId';
import { addFinding, keepCode, mustBeOurs, startStay } from '../fish';
import type { Scope } from '../scope';
import { keepAnimal, type Taking, tell } from './importedAncestors';
import { lotFor, strainFor } from './importedStock';
import type { SheetRead } from './readSource';

/** The fish themselves: founders here, in a lot and a tank, with the parents that the sheet tells. */
export async function keepHeads(scope: Scope, taking: Taking & { draft: ImportDraft }): Promise<void> {
  const { plan, read, draft, importId } = taking;
  if (draft.heads === 0) return;
  const { content } = read;
  const subject = plan.animals.find(({ entry }) => entry.id === content.subject.id);
  if (!subject) return;
  await mustBeOurs(scope, 'tank', draft.tankId ?? '', 'tankId', 'Choose a tank');
  const strainId = content.strain.claim === 'strain' ? await strainFor(scope, taking) : null;
  const lotId = strainId ? await lotFor(scope, strainId, taking) : null;
  const sexes = headSexes(content.subject.heads).slice(plan.same?.heads ?? 0);
  for (let i = 0; i < draft.heads; i += 1) {
    const known = content.subject.kind === 'fish' ? subject.fishId : null;
    const fishId = known ?? (await freshHead(scope, { importId, subject: subject.entry, content }));
    await settle(scope, { fishId, importId, strainId, lotId, draft });
    const sex = sexes[i];
    if (sex && sex !== 'unsexed')
      await addFinding(scope, {
        fishId,
        kind: 'sex',
        onDay: draft.receivedOn,
        value: sex,
        how: 'told',
        certain: content.subject.sexSure,
        entryId: null,
      });
  }
}

const headSexes = ({ male, female, unsexed }: SheetRead['content']['subject']['heads']) => [
  ...Array<'male'>(male).fill('male'),
  ...Array<'female'>(female).fill('female'),
  ...Array<'unsexed'>(unsexed).fill('unsexed'),
];

/** A fish has its first issuer's name; the heads of a brood have none beyond this fishroom. */
async function freshHead(
  scope: Scope,
  { importId, subject, content }: { importId: string; subject: AncestryEntry; content: SheetRead['content'] },
): Promise<string> {
  if (content.subject.kind === 'fish') return keepAnimal(scope, { importId, entry: { ...subject, sex: 'unsexed' } });
  const { db, roomId, now } = scope;
  const id = newId(now);
  await db
    .insertInto('fish')
    .values({
      roomId,
      id,
      code: null,
      strainId: null,
      origin: 'founder',
      lotId: null,
      batchId: null,
      broodId: null,
      parentageId: null,
      bornOn: subject.born,
      arrivedOn: null,
      keptAs: 'other',
      note: null,
      entryId: null,
      createdAt: now,
    })
    .execute();
  await tell(scope, { importId, entry: subject, fishId: id, here: 1 });
  return id;
}

type Settling = { fishId: string; importId: string; strainId: string | null; lotId: string | null; draft: ImportDraft };

/** From a record to a fish that lives here; one that was known as an ancestor becomes one too. */
async function settle(scope: Scope, { fishId, importId, strainId, lotId, draft }: Settling): Promise<void> {
  const { db, roomId } = scope;
  await keepCode(draft.code, 'code', () =>
    db
      .updateTable('fish')
      .set({
        origin: 'founder',
        strainId,
        lotId,
        arrivedOn: draft.receivedOn,
        keptAs: draft.keptAs,
        ...(draft.code ? { code: draft.code } : {}),
      })
      .where('roomId', '=', roomId)
      .where('id', '=', fishId)
      .execute(),
  );
  await db
    .updateTable('toldFish')
    .set({ here: 1, importedSheetId: importId })
    .where('roomId', '=', roomId)
    .where('fishId', '=', fishId)
    .execute();
  await startStay(scope, {
    column: 'fishId',
    id: fishId,
    tankId: draft.tankId ?? '',
    onDay: draft.receivedOn,
    entryId: null,
  });
}
