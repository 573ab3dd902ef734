import type { Ago } from './shape';

export type Care = { tank: string; on: Ago; note?: string } & (
  | { kind: 'quarantine'; until: Ago | null; why: string }
  | { kind: 'treatment'; what: string; why: string; dose: string | null; until: Ago | null; endedOn?: Ago }
  | { kind: 'seenWell' }
);

/** Quarantines of new arrivals, and what was given, always as the label and the veterinarian said. */
export const CARE: Care[] = [
  { tank: 'Q1', on: -735, kind: 'quarantine', until: -707, why: 'MOIL new from the importer' },
  { tank: 'B1', on: -735, kind: 'quarantine', until: -712, why: 'ESMI new: alone in the tank' },
  { tank: 'Q2', on: -731, kind: 'quarantine', until: -709, why: 'LEMP new' },
  { tank: 'B3', on: -729, kind: 'quarantine', until: -708, why: 'CALI new: alone in the tank' },
  { tank: 'R5', on: -720, kind: 'quarantine', until: -690, why: 'CATE new: alone in the tank' },
  { tank: 'R4', on: -690, kind: 'quarantine', until: -662, why: 'MEUT new: alone in the tank' },
  {
    tank: 'Q1',
    on: -728,
    kind: 'treatment',
    what: 'Praziquantel',
    why: 'Gill flukes seen under the microscope',
    dose: 'By the label, repeated after a week',
    until: -718,
    endedOn: -718,
    note: 'Salka looked at the smear',
  },
  {
    tank: 'R1',
    on: -548,
    kind: 'treatment',
    what: 'Epsom salt in the food',
    why: 'MOIL-A03 swollen, does not eat',
    dose: 'As Salka said',
    until: -541,
    endedOn: -541,
    note: 'Flat again, eats',
  },
  { tank: 'Q2', on: -9, kind: 'quarantine', until: 19, why: 'Three CALI from Kaspar' },
  {
    tank: 'G1',
    on: -3,
    kind: 'treatment',
    what: 'Praziquantel',
    why: 'Some rub against the sand',
    dose: 'By the label, Salka agrees',
    until: 4,
  },
  { tank: 'R3', on: -2, kind: 'seenWell' },
];

export const INCIDENTS: { tanks: string[]; on: Ago; what: string; note: string | null }[] = [
  {
    tanks: ['B3'],
    on: -373,
    what: 'Heater failed',
    note: 'Unplugged before reaching in. CALI-A goes to B1 until a new one runs.',
  },
  {
    tanks: ['R1', 'R2', 'R3', 'R4', 'R5', 'R6', 'B1', 'B2', 'B3'],
    on: -188,
    what: 'Power cut, three hours',
    note: 'No losses. Air from the battery pumps.',
  },
];
