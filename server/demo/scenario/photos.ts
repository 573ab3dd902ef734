import type { Description, DrawnSpecies, FishDescription, Orientation, TrayDescription } from '../drawings';
import type { Ago, Key } from './shape';
import type { StrainCode } from './strains';

/** What is drawn for each strain. */
const SPECIES_OF = {
  MOIL: 'tropheus-moorii',
  LEMP: 'cyprichromis-leptosoma',
  MEUT: 'enantiopus-melanogenys',
  ESMI: 'maylandia-estherae',
  CALI: 'labidochromis-caeruleus',
  CATE: 'altolamprologus-calvus',
} as const satisfies Record<StrainCode, DrawnSpecies>;

/** As the fishroom's two phones take them: one is usually held upright, with its sensor turned. */
const WIDE = { w: 1280, h: 960 };

export type PhotoStory = {
  of: { thing: 'fish' | 'brood' | 'batch' | 'colony' | 'hold' | 'tank'; key: Key };
  on: Ago;
  caption: string | null;
  orientation?: Orientation;
  drawing: Description;
};

type Who = Pick<FishDescription, 'life' | 'individual' | 'lengthMm'> & Partial<FishDescription>;

const fish = (strain: StrainCode, setting: 'box' | 'tank', shot: string, who: Who): FishDescription => ({
  species: SPECIES_OF[strain],
  setting,
  pose: 'left',
  shot,
  size: WIDE,
  ...who,
});

export const tray = (
  strain: StrainCode,
  shot: string,
  what: Pick<TrayDescription, 'life' | 'count' | 'lengthMm'>,
): TrayDescription => ({
  species: SPECIES_OF[strain],
  setting: 'tray',
  shot,
  size: WIDE,
  ...what,
});

/** A young fish over the ruler; `spanMm` keeps the pictures of one brood at one scale. */
export const overRuler = (
  strain: StrainCode,
  shot: string,
  { lengthMm, spanMm }: { lengthMm: number; spanMm: number },
): FishDescription =>
  fish(strain, 'box', shot, { life: lengthMm < 20 ? 'fry' : 'juvenile', individual: shot, lengthMm, spanMm });

const holding = (
  handle: string,
  strain: StrainCode,
  on: Ago,
  lengthMm: number,
  more: Partial<PhotoStory> & Partial<FishDescription> = {},
): PhotoStory => {
  const { caption = null, orientation = 1, pose = 'left', setting = 'tank' } = more;
  return {
    of: { thing: 'hold', key: `hold:${handle}` },
    on,
    caption,
    orientation,
    drawing: fish(strain, setting, `hold ${handle}`, {
      life: 'female',
      individual: handle,
      lengthMm,
      holding: true,
      pose,
      companions: 1,
    }),
  };
};

const portrait = (
  code: string,
  strain: StrainCode,
  on: Ago,
  who: Partial<FishDescription> & { lengthMm: number },
): PhotoStory => ({
  of: { thing: 'fish', key: `fish:${code}` },
  on,
  caption: null,
  drawing: fish(strain, 'box', `portrait ${code} ${on}`, { life: 'male', individual: code, ...who }),
});

const colony = (
  code: string,
  strain: StrainCode,
  on: Ago,
  lengthMm: number,
  more: Partial<FishDescription> & { caption?: string } = {},
): PhotoStory => {
  const { caption = null, ...who } = more;
  return {
    of: { thing: 'colony', key: `colony:${code}` },
    on,
    caption,
    drawing: fish(strain, 'tank', `colony ${code} ${on}`, {
      life: 'male',
      individual: `${code} ${on}`,
      lengthMm,
      companions: 4,
      ...who,
    }),
  };
};

/** Pictures of grown fish, colonies, holds and tanks. Those of broods follow from their samples. */
export const PHOTOS: PhotoStory[] = [
  colony('MOIL-A', 'MOIL', -700, 96, { caption: 'Out of quarantine' }),
  colony('MOIL-A', 'MOIL', -180, 118, { pose: 'right', caption: 'The Ilangi colony' }),
  colony('LEMP-A', 'LEMP', -640, 98),
  colony('LEMP-B', 'LEMP', -235, 78, { life: 'female', pose: 'right' }),
  colony('MEUT-A', 'MEUT', -600, 122, { caption: 'MEUT-A01 over its crater' }),
  colony('ESMI-A', 'ESMI', -650, 104, { pose: 'three-quarter' }),
  colony('ESMI-B', 'ESMI', -210, 82, { life: 'female' }),
  colony('CALI-A', 'CALI', -620, 88, { pose: 'three-quarter' }),
  colony('CALI-A', 'CALI', -325, 92, { caption: 'Back in B3', pose: 'right' }),
  colony('CATE-A', 'CATE', -560, 124, { companions: 2 }),
  holding('m1', 'MOIL', -650, 100, { setting: 'box', orientation: 6 }),
  holding('m4', 'MOIL', -106, 108, { pose: 'right' }),
  holding('o1', 'MOIL', -9, 112, { caption: 'Day 15', orientation: 6 }),
  holding('o2', 'MOIL', -6, 106, { pose: 'right', caption: 'Will not be caught without driving the others' }),
  holding('o4', 'LEMP', -5, 84, { pose: 'right' }),
  holding('o7', 'ESMI', -6, 86),
  holding('c3', 'CALI', -128, 84, { setting: 'box' }),
  holding('e4', 'MEUT', -66, 118),
  portrait('MOIL-A02', 'MOIL', -700, { lengthMm: 112, spanMm: 150 }),
  portrait('MOIL-A04', 'MOIL', -700, { lengthMm: 104, spanMm: 150, pose: 'right' }),
  portrait('MOIL-A04', 'MOIL', -200, { lengthMm: 121, spanMm: 150, pose: 'right' }),
  portrait('MOIL-01', 'MOIL', -60, { lengthMm: 76, spanMm: 120, life: 'juvenile' }),
  portrait('LEMP-B05', 'LEMP', -290, { lengthMm: 74, spanMm: 120 }),
  portrait('ESMI-B09', 'ESMI', -245, { lengthMm: 92, spanMm: 120 }),
  portrait('ESMI-B13', 'ESMI', -150, { lengthMm: 70, spanMm: 120, pose: 'right' }),
  portrait('CATE-A01', 'CATE', -650, { lengthMm: 128, spanMm: 150 }),
  portrait('CALI-A01', 'CALI', -610, { lengthMm: 92, spanMm: 120, pose: 'right' }),
  portrait('MEUT-A02', 'MEUT', -228, { lengthMm: 138, spanMm: 180 }),
  {
    of: { thing: 'hold', key: 'hold:o6' },
    on: -3,
    caption: 'Before shell 4',
    drawing: fish('CATE', 'tank', 'hold o6', {
      life: 'male',
      individual: 'CATE-A01',
      lengthMm: 128,
      pose: 'right',
      companions: 1,
    }),
  },
  {
    of: { thing: 'tank', key: 'tank:R4' },
    on: -45,
    caption: 'New sand, three craters already',
    drawing: fish('MEUT', 'tank', 'tank R4', { life: 'male', individual: 'MEUT-A02', lengthMm: 140, companions: 5 }),
  },
  {
    of: { thing: 'brood', key: 'brood:f1' },
    on: -357,
    caption: 'The foreign fry, on its own',
    drawing: fish('CALI', 'box', 'foreign fry', { life: 'fry', individual: 'foreign', lengthMm: 14.5, spanMm: 32 }),
  },
  {
    of: { thing: 'brood', key: 'brood:e3' },
    on: -199,
    caption: 'Three that never developed',
    drawing: tray('MEUT', 'eggs e3', { life: 'eggs', count: 3, lengthMm: 3.6 }),
  },
];
