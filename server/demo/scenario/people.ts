import type { Buyer, Member } from './shape';

/*
 * The people of the demo fishroom. All are invented; `.example` is reserved and reaches nobody (RFC 2606).
 */

export const ROOM = {
  name: 'Underhill Fishroom',
  slug: 'underhill',
  place: 'Cellar of the old dairy',
  timeZone: 'Europe/Dublin',
  currency: 'EUR',
} as const;

export const MEMBERS: Member[] = [
  { key: 'account:nora', name: 'Nora Castellane', email: 'nora@underhill.example', role: 'owner' },
  { key: 'account:idris', name: 'Idris Wendover', email: 'idris@underhill.example', role: 'keeper' },
  { key: 'account:pim', name: 'Pim Oslund', email: 'pim@underhill.example', role: 'helper' },
  { key: 'account:salka', name: 'Salka Brenn, veterinarian', email: 'salka@brenn-vet.example', role: 'viewer' },
];

/** Where the founders came from. */
export const SUPPLIERS = {
  importer: 'R. Achterberg, importer',
  kaspar: 'Kaspar Lindqvern, breeder',
  yvette: 'Yvette Amaro, breeder',
  auction: 'Auction of the Fensby aquarium society',
} as const;

export const BUYERS: Buyer[] = [
  { key: 'buyer:rowse', name: 'Benedikt Rowse', email: 'b.rowse@mail.example', phone: '+353 1 555 0141', note: null },
  {
    key: 'buyer:torvund',
    name: 'Maia Torvund',
    email: 'maia.torvund@mail.example',
    phone: null,
    note: 'Keeps the same strain since last year',
  },
  {
    key: 'buyer:quay',
    name: 'Quay Street Aquarium Shop',
    email: 'orders@quaystreet.example',
    phone: '+353 1 555 0178',
    note: 'Takes groups of ten or more, invoice',
  },
  { key: 'buyer:halvard', name: 'Halvard Ness', email: 'halvard@ness.example', phone: null, note: null },
  {
    key: 'buyer:odile',
    name: 'Odile Ferrant',
    email: 'odile.ferrant@mail.example',
    phone: '+353 1 555 0163',
    note: 'Collects on Saturdays',
  },
  { key: 'buyer:jun', name: 'Jun Akerley', email: 'jun@akerley.example', phone: null, note: null },
  {
    key: 'buyer:school',
    name: 'Millbrook School, biology room',
    email: 'biology@millbrook-school.example',
    phone: null,
    note: null,
  },
  {
    key: 'buyer:wanda',
    name: 'Wanda Sillitoe',
    email: 'wanda.sillitoe@mail.example',
    phone: '+353 1 555 0119',
    note: null,
  },
];
