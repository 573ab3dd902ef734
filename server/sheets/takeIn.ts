import { PedigreeError } from '../../shared/lineage/pedigreeError';
import { sortPedigree } from '../../shared/lineage/sortedPedigree';
import { Refusal } from '../../shared/refusal';
import type { ImportDraft, ImportedRow } from '../../shared/sheets/importContract';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { inTransaction } from '../http/serve';
import { pedigreeOf } from '../lineage';
import type { Scope } from '../scope';
import { oneImported } from './imported';
import { keepAncestors } from './importedAncestors';
import { keepHeads } from './importedHeads';
import { type ImportPlan, planImport } from './importPlan';
import { readSource, type SheetRead } from './readSource';

/** Checks the sheet again, outside the transaction since others may be asked, then writes all of it or nothing. */
export async function takeIn(scope: Scope, draft: ImportDraft): Promise<ImportedRow> {
  const read = await readSource(scope, draft.source);
  const id = await inTransaction(scope, async (inside) => {
    const plan = await planImport(inside, read);
    mustFit(inside, draft, read, plan);
    const importId = plan.same?.importId ?? (await keepSheet(inside, read));
    await keepAncestors(inside, { importId, plan, read });
    await keepHeads(inside, { importId, plan, read, draft });
    await mustBePedigree(inside);
    await audit(inside, {
      action: 'sheet taken in',
      about: 'sheet',
      aboutId: importId,
      change: { heads: [plan.same?.heads ?? 0, (plan.same?.heads ?? 0) + draft.heads] },
    });
    return importId;
  });
  return oneImported(scope, id);
}

const wrong = (field: string, sentence: string) => new Refusal('invalid', sentence, { [field]: sentence });

function mustFit(scope: Scope, draft: ImportDraft, { trust, content }: SheetRead, plan: ImportPlan): void {
  if (plan.refused) throw new Refusal('conflict', plan.refused);
  const taken = plan.same?.heads ?? 0;
  if (draft.taken !== taken)
    throw new Refusal('conflict', `${taken} fish of this sheet were taken in meanwhile. Look at it again.`);
  if (trust.signature === 'keyUnknown' && !draft.unchecked)
    throw wrong('unchecked', 'Its signature could not be checked: say that you take it in all the same');
  const left = content.subject.kind === 'fish' && isHere(plan, content.subject.id) ? 0 : plan.heads - taken;
  if (draft.heads > left) throw wrong('heads', left === 0 ? 'This fish is here already' : `At most ${left}`);
  if (draft.heads === 0 && plan.before.length === 0) throw wrong('heads', 'At least one');
  if (draft.receivedOn > scope.today) throw wrong('receivedOn', 'That day is still to come');
  if (draft.heads > 0 && !draft.tankId) throw wrong('tankId', 'Choose a tank');
  if (draft.heads > 0 && content.strain.claim === 'strain' && !draft.strainId && !draft.newStrain)
    throw wrong('strainId', 'Choose a strain');
}

/** Whether the subject came in before, by another sheet. */
const isHere = (plan: ImportPlan, subjectId: string): boolean =>
  plan.before.some(({ heads }) => heads > 0) &&
  plan.animals.some(({ entry, fishId }) => entry.id === subjectId && fishId);

async function keepSheet({ db, roomId, actorId, now }: Scope, { jws, content, trust }: SheetRead): Promise<string> {
  const id = newId(now);
  await db
    .insertInto('importedSheet')
    .values({
      roomId,
      id,
      issuer: content.fishroom.id,
      number: content.issue.number,
      jws,
      content: JSON.stringify(content),
      keyId: trust.keyId,
      signature: trust.signature,
      keysFrom: trust.keysFrom,
      importedBy: actorId,
      createdAt: now,
      entryId: null,
    })
    .execute();
  return id;
}

/** Two sheets can be sound and contradict each other: the fish here must still make a pedigree. */
async function mustBePedigree(scope: Scope): Promise<void> {
  try {
    sortPedigree((await pedigreeOf(scope)).entries);
  } catch (error) {
    if (!(error instanceof PedigreeError)) throw error;
    throw new Refusal(
      'conflict',
      'Together with what is known here, a fish would be its own ancestor. Ask the fishrooms which sheet is right.',
    );
  }
}
