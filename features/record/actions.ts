import type { IconName } from '@/components/ui/iconMarks';

/** What a form is about besides its tank; passed on when the sheet is opened on a page of it. */
export type FormOf = 'tank' | 'colony' | 'hold' | 'brood' | 'batch' | 'fish';

export type RecordAction = {
  word: string;
  icon: IconName;
  /** The form's address below `/record/`. */
  form: string;
  takes: readonly FormOf[];
  /** Recorded at once, without a form, where the tank says all there is to say. */
  atOnce?: 'oneDead' | 'seenWell';
};

const action = (
  word: string,
  icon: IconName,
  form: string,
  takes: readonly FormOf[],
  atOnce?: RecordAction['atOnce'],
): RecordAction => ({ word, icon, form, takes, ...(atOnce ? { atOnce } : {}) });

const MOUTH = ['tank', 'colony', 'hold'] as const;
const BROOD = ['tank', 'brood', 'batch'] as const;
const TANK = ['tank'] as const;
const FISH = ['tank', 'colony', 'fish'] as const;

/** What can be recorded, in groups of even numbers, the frequent first. */
export const RECORD_GROUPS: readonly { word: string; actions: readonly RecordAction[] }[] = [
  {
    word: 'In the mouth',
    actions: [
      action('Holding seen', 'holding', 'holding', MOUTH),
      action('Check', 'check', 'check', MOUTH),
      action('Strip', 'strip', 'strip', MOUTH),
      action('Release', 'release', 'release', MOUTH),
      action('Spawn seen', 'spawn', 'spawn', MOUTH),
      action('Swallowed, lost', 'swallowed', 'swallowed', MOUTH),
    ],
  },
  {
    word: 'Brood',
    actions: [
      action('One dead', 'loss', 'loss', BROOD, 'oneDead'),
      action('Head count', 'headCount', 'head-count', BROOD),
      action('Length sample', 'lengthSample', 'length-sample', [...BROOD, 'fish']),
      action('Photo', 'photo', 'photo', [...BROOD, 'colony', 'hold', 'fish']),
      action('Loss, cull', 'minus', 'loss', BROOD),
      action('Hold back', 'heldBack', 'hold-back', BROOD),
      action('Split', 'move', 'split', BROOD),
      action('Brood found', 'release', 'brood-found', TANK),
    ],
  },
  {
    word: 'Tank',
    actions: [
      action('Water test', 'waterTest', 'water-test', TANK),
      action('Water change', 'waterChange', 'water-change', TANK),
      action('Seen well', 'eye', 'seen-well', TANK, 'seenWell'),
      action('Move', 'move', 'move', ['tank', 'colony', 'batch', 'fish']),
      action('Treatment', 'treatment', 'treatment', TANK),
      action('Incident', 'warn', 'incident', TANK),
    ],
  },
  {
    word: 'Fish',
    actions: [
      action('Dominant', 'dominant', 'dominant', FISH),
      action('Fish died', 'loss', 'fish-left', FISH),
      action('Sex or mark', 'lineage', 'finding', FISH),
      action('Told apart', 'edit', 'told-apart', FISH),
    ],
  },
];
