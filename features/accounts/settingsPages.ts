import type { Action } from '@/shared/roles';

type RoomPage = { name: string; word: string; note: string; needs: Action };

/** Pages under /settings of the fishroom, in the order of the list. `name` is the last part of the address. */
export const roomPages: readonly RoomPage[] = [
  { name: 'fishroom', word: 'Fishroom', note: 'Name, place, time zone, currency, units', needs: 'room:see' },
  { name: 'members', word: 'Members', note: 'Roles, invitations, leaving', needs: 'member:see' },
  { name: 'sheets', word: 'Lineage sheets', note: 'What they tell of other people, keys', needs: 'key:manage' },
  { name: 'intervals', word: 'When things are due', note: 'Checks, head counts, samples, water', needs: 'room:see' },
  { name: 'orders', word: 'Orders', note: 'Holding time, deposit, losses, bank transfer', needs: 'money:see' },
  { name: 'letters', word: 'Letters', note: 'What went out, what waits, what was not taken', needs: 'buyer:see' },
  { name: 'import', word: 'Import', note: 'Spreadsheets, a fishroom from an archive', needs: 'data:import' },
  {
    name: 'export',
    word: 'Export and checks',
    note: 'Archive, tables, what is missing, deleting',
    needs: 'data:export',
  },
  { name: 'trail', word: 'Audit trail', note: 'Who recorded and changed what, and when', needs: 'audit:see' },
];

export const yourPages = [
  { name: 'you', word: 'Name and units', note: 'How you are named, and what you read in' },
  { name: 'daily', word: 'Daily letter and calendar', note: 'What is due, sent to you' },
  { name: 'security', word: 'Address and password', note: 'Email, password, second step' },
  { name: 'sign-ins', word: 'Sign-ins', note: 'Devices that are signed in as you' },
  { name: 'delete-account', word: 'Delete your account', note: 'Name, address and sign-ins go' },
] as const;
