import { counted, type FoundStory, type HoldStory, left, lost, moved } from './broods';

export const CATE_HOLDS: HoldStory[] = [
  {
    handle: 'a1',
    colony: 'CATE-A',
    dam: 'fish:CATE-A03',
    spawn: -480,
    seenWith: 'fish:CATE-A01',
    plan: 'leave',
    checks: [3, 9],
    note: 'Shell 2, the male keeps the others off',
    end: { how: 'released', after: 0 },
    brood: {
      tank: 'R5',
      numbers: { total: 74, freeSwimming: 74 },
      opens: { age: 'atOnce', heads: 74 },
      steps: [
        counted(45, 68, 'Guessed in threes: they hide'),
        moved(80, 'G9'),
        lost(82, 3, 'equipment', 'Drawn in by the filter'),
        counted(130, 63),
        lost(170, 1, 'foundDead'),
        left(210, 'sold', 20, { order: 'order:1007' }),
        left(260, 'sold', 18, { order: 'order:1010' }),
        left(300, 'auctioned', 12),
        left(330, 'traded', 6, { note: 'For plants' }),
        left(352, 'sold', 6, { order: 'order:1012' }),
      ],
    },
  },
  {
    handle: 'o6',
    colony: 'CATE-A',
    dam: 'fish:CATE-A05',
    spawn: -5,
    seenWith: 'fish:CATE-A01',
    plan: 'leave',
    checks: [2],
    note: 'Shell 4. She fans, he stands before it',
  },
];

/** Fry that were there one morning: the spawn in shell 3 was missed. */
export const CATE_FOUND: FoundStory[] = [
  {
    handle: 'a2',
    colony: 'CATE-A',
    dam: 'fish:CATE-A04',
    spawn: [-216, -212],
    on: -198,
    brood: {
      tank: 'R5',
      numbers: { total: 52, freeSwimming: 52 },
      opens: { age: 'atOnce', heads: 52 },
      note: 'Round shell 3, the female close by',
      steps: [
        counted(40, 49),
        moved(74, 'G8'),
        lost(80, 2, 'equipment', 'Behind the filter mat'),
        counted(130, 46),
        counted(184, 46),
        left(190, 'sold', 10, { order: 'order:1017' }),
      ],
    },
  },
];
