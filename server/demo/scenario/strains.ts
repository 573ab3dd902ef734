import { addDays, type Day } from '../../../shared/days';
import { SUPPLIERS } from './people';
import type { Ago, Lot, Strain } from './shape';

type StrainStory = Omit<Strain, 'acquiredOn' | 'key'> & { acquired: Ago };
type LotStory = Omit<Lot, 'receivedOn' | 'quarantineUntil' | 'key' | 'strain'> & {
  code: string;
  strain: StrainCode;
  received: Ago;
  quarantine: Ago | null;
};

export type StrainCode = 'MOIL' | 'LEMP' | 'MEUT' | 'ESMI' | 'CALI' | 'CATE';

const described = {
  naming: 'described',
  scientificName: null,
  synonyms: null,
  localityKnown: 'known',
  papers: null,
  citesSource: null,
} as const;

export const STRAINS: Record<StrainCode, StrainStory> = {
  MOIL: {
    ...described,
    code: 'MOIL',
    speciesId: 'tropheus-moorii',
    tradeName: 'Lemon yellow',
    locality: 'Ilangi',
    provenance: 'wildCaught',
    fromWhom: SUPPLIERS.importer,
    acquired: -735,
    papers: 'Delivery note of the importer, with place of capture',
    citesSource: 'W',
    note: 'Vegetable food only. Never add single fish to the colony.',
  },
  LEMP: {
    ...described,
    code: 'LEMP',
    speciesId: 'cyprichromis-leptosoma',
    tradeName: null,
    locality: 'Mpulungu',
    provenance: 'bredElsewhere',
    fromWhom: SUPPLIERS.kaspar,
    acquired: -731,
    note: 'Males with yellow tails only. They jump: keep the covers shut.',
  },
  MEUT: {
    ...described,
    code: 'MEUT',
    speciesId: 'enantiopus-melanogenys',
    tradeName: null,
    locality: 'Utinta',
    provenance: 'bredElsewhere',
    fromWhom: SUPPLIERS.yvette,
    acquired: -690,
    note: 'Fine sand, low light, no sudden moves.',
  },
  ESMI: {
    ...described,
    code: 'ESMI',
    speciesId: 'maylandia-estherae',
    tradeName: 'Red zebra',
    synonyms: 'Metriaclima estherae, Pseudotropheus estherae',
    locality: 'Minos Reef',
    provenance: 'wildCaught',
    fromWhom: SUPPLIERS.importer,
    acquired: -735,
    note: 'Blue males, orange females.',
  },
  CALI: {
    ...described,
    code: 'CALI',
    speciesId: 'labidochromis-caeruleus',
    tradeName: 'Electric yellow',
    locality: 'Lion’s Cove',
    localityKnown: 'trade',
    provenance: 'unknown',
    fromWhom: SUPPLIERS.auction,
    acquired: -729,
    note: 'Sold as Lion’s Cove at the auction, without papers.',
  },
  CATE: {
    ...described,
    code: 'CATE',
    speciesId: 'altolamprologus-calvus',
    tradeName: 'Black calvus',
    locality: 'Tembwe',
    provenance: 'wildCaught',
    fromWhom: SUPPLIERS.importer,
    acquired: -720,
    citesSource: 'W',
    note: 'Each female has a snail shell or cave that only she fits into.',
  },
};

const LOTS: LotStory[] = [
  {
    code: 'MOIL-1',
    strain: 'MOIL',
    received: -735,
    fromWhom: SUPPLIERS.importer,
    provenance: 'wildCaught',
    generation: 0,
    heads: 18,
    deadOnArrival: 1,
    quarantine: -707,
    papers: 'Place and day of capture on the delivery note',
    mayBeSibs: true,
    note: null,
  },
  {
    code: 'LEMP-1',
    strain: 'LEMP',
    received: -731,
    fromWhom: SUPPLIERS.kaspar,
    provenance: 'bredElsewhere',
    generation: 2,
    heads: 14,
    deadOnArrival: 0,
    quarantine: -709,
    papers: null,
    mayBeSibs: true,
    note: 'From two broods of his group, not marked',
  },
  {
    code: 'MEUT-1',
    strain: 'MEUT',
    received: -690,
    fromWhom: SUPPLIERS.yvette,
    provenance: 'bredElsewhere',
    generation: 1,
    heads: 9,
    deadOnArrival: 0,
    quarantine: -662,
    papers: 'Letter of the breeder: parents wild caught',
    mayBeSibs: true,
    note: null,
  },
  {
    code: 'ESMI-1',
    strain: 'ESMI',
    received: -735,
    fromWhom: SUPPLIERS.importer,
    provenance: 'wildCaught',
    generation: 0,
    heads: 6,
    deadOnArrival: 0,
    quarantine: -712,
    papers: 'Place of capture on the delivery note',
    mayBeSibs: true,
    note: null,
  },
  {
    code: 'ESMI-2',
    strain: 'ESMI',
    received: -733,
    fromWhom: SUPPLIERS.yvette,
    provenance: 'bredElsewhere',
    generation: 1,
    heads: 4,
    deadOnArrival: 0,
    quarantine: -712,
    papers: null,
    mayBeSibs: true,
    note: 'Sisters',
  },
  {
    code: 'CALI-1',
    strain: 'CALI',
    received: -729,
    fromWhom: SUPPLIERS.auction,
    provenance: 'unknown',
    generation: null,
    heads: 8,
    deadOnArrival: 0,
    quarantine: -708,
    papers: null,
    mayBeSibs: true,
    note: null,
  },
  {
    code: 'CATE-1',
    strain: 'CATE',
    received: -720,
    fromWhom: SUPPLIERS.importer,
    provenance: 'wildCaught',
    generation: 0,
    heads: 5,
    deadOnArrival: 0,
    quarantine: -690,
    papers: 'Delivery note of the importer',
    mayBeSibs: false,
    note: null,
  },
  {
    code: 'CALI-2',
    strain: 'CALI',
    received: -9,
    fromWhom: SUPPLIERS.kaspar,
    provenance: 'bredElsewhere',
    generation: 3,
    heads: 3,
    deadOnArrival: 0,
    quarantine: 19,
    papers: null,
    mayBeSibs: true,
    note: 'To join CALI-A once they have been watched',
  },
];

export function strainsOn(today: Day): Strain[] {
  return Object.values(STRAINS).map(({ acquired, ...strain }) => ({
    ...strain,
    key: `strain:${strain.code}`,
    acquiredOn: addDays(today, acquired),
  }));
}

export function lotsOn(today: Day): Lot[] {
  return LOTS.map(({ code, strain, received, quarantine, ...lot }) => ({
    ...lot,
    key: `lot:${code}`,
    strain: `strain:${strain}`,
    receivedOn: addDays(today, received),
    quarantineUntil: quarantine === null ? null : addDays(today, quarantine),
  }));
}
