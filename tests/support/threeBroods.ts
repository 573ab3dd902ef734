import type { Sex } from '@/shared/fish/contract';
import { type Colony, colonyIn, holdIn, NO_NUMBERS, record, tankIn } from './stock';
import { makeId, type Person } from './testApp';

export type ThreeBroods = { colony: Colony; growOut: string; empty: string; fish: Record<string, string> };

/**
 * Two wild males and three wild females that are strangers to each other. Each female's mouthful is of A01 (three shares)
 * or of A02 (one), each male the sire of all of it or of none. Held back: a brother and a sister of the first, a sister
 * of the second, a sister of the third.
 */
export async function threeBroods(person: Person, roomId: string): Promise<ThreeBroods> {
  const colony = await colonyIn(person, roomId, { females: 3 });
  const growOut = await tankIn(person, roomId, 'G1', 200);
  const empty = await tankIn(person, roomId, 'R9', 500);
  const kept: [string, Sex][][] = [
    [
      ['MOKA-K1', 'male'],
      ['MOKA-K2', 'female'],
    ],
    [['MOKA-K3', 'female']],
    [['MOKA-K4', 'female']],
  ];
  const fish: Record<string, string> = {};
  for (const [i, holdbacks] of kept.entries()) {
    const batchId = await strippedOf(person, roomId, colony, { i, growOut });
    const taken = holdbacks.map(([code, sex]) => ({ id: makeId(), code, sex }));
    for (const { id, code } of taken) fish[code] = id;
    await record(person, roomId, {
      kind: 'heldBack',
      batchId,
      onDay: '2026-05-01',
      fish: taken,
      keptAs: 'holdback',
      tankId: growOut,
      colonyId: null,
      note: null,
    });
  }
  return { colony, growOut, empty, fish };
}

async function strippedOf(
  person: Person,
  roomId: string,
  colony: Colony,
  { i, growOut }: { i: number; growOut: string },
): Promise<string> {
  const holderId = colony.females[i] ?? null;
  const holdId = await holdIn(person, roomId, colony, { holderId });
  const batchId = makeId();
  await record(person, roomId, {
    kind: 'holdEnded',
    holdId,
    onDay: '2026-04-28',
    outcome: 'stripped',
    note: null,
    brood: {
      broodId: makeId(),
      batchId,
      code: `MOKA-26${'ABC'[i]}`,
      tankId: growOut,
      opening: 20,
      numbers: { ...NO_NUMBERS, total: 20 },
    },
  });
  return batchId;
}
