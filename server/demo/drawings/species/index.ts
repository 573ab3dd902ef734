import type { Drawn } from '../anatomy';
import { altolamprologusCalvus } from './altolamprologusCalvus';
import { cyprichromisLeptosoma } from './cyprichromisLeptosoma';
import { cyrtocaraMoorii } from './cyrtocaraMoorii';
import { enantiopusMelanogenys } from './enantiopusMelanogenys';
import { eretmodusCyanostictus } from './eretmodusCyanostictus';
import { labidochromisCaeruleus } from './labidochromisCaeruleus';
import { maylandiaEstherae } from './maylandiaEstherae';
import { tropheusMoorii } from './tropheusMoorii';

/** The species that can be drawn, by their id in the species library. Builds and colours are from memory of the live fish. */
export const DRAWN = {
  'altolamprologus-calvus': altolamprologusCalvus,
  'cyprichromis-leptosoma': cyprichromisLeptosoma,
  'cyrtocara-moorii': cyrtocaraMoorii,
  'enantiopus-melanogenys': enantiopusMelanogenys,
  'eretmodus-cyanostictus': eretmodusCyanostictus,
  'labidochromis-caeruleus': labidochromisCaeruleus,
  'maylandia-estherae': maylandiaEstherae,
  'tropheus-moorii': tropheusMoorii,
} as const satisfies Record<string, Drawn>;

export type DrawnSpecies = keyof typeof DRAWN;
