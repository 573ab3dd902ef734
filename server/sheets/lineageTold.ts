import type { AvailableFish } from '../../shared/buyers/available';
import { type KinSlot, kinOf } from '../../shared/sheets/kin';
import { completenessWords, generationWords, inbreedingWords } from '../../shared/sheets/sayings';
import type { RoomAsked } from '../scope';
import { ancestorsOf, lineageOf, namingOf } from './lineagePart';

/** The lineage of a brood in the words of its sheet: what a buyer may read before there is one. */
export async function lineageTold(scope: RoomAsked, broodId: string): Promise<AvailableFish['lineage']> {
  const nodes = await ancestorsOf(scope, broodId);
  const naming = await namingOf(scope);
  const { generation, inbreeding, ancestry } = lineageOf(nodes, broodId, naming);
  const kin = kinOf(ancestry, naming.animal(broodId));
  return {
    generation: generationWords(generation),
    inbreeding: inbreedingWords(inbreeding),
    known: completenessWords(inbreeding),
    parents: kin.parents.map((slot) => ({ ...slotOf(slot), parents: slot.parents.map(slotOf) })),
    furtherBack: Math.max(0, kin.furtherBack),
  };
}

const slotOf = ({ role, codes, otherwise, notes, sure }: KinSlot) => ({ role, codes, otherwise, notes, sure });
