/** What each role may do. Read by the server before every answer and by the screens before every button. */
export const ROLES = ['owner', 'keeper', 'helper', 'viewer'] as const;
export type Role = (typeof ROLES)[number];

const MAY = {
  'room:see': ['owner', 'keeper', 'helper', 'viewer'],
  'room:manage': ['owner'],
  'member:see': ['owner', 'keeper', 'helper', 'viewer'],
  'member:manage': ['owner'],
  'stock:see': ['owner', 'keeper', 'helper', 'viewer'],
  'stock:write': ['owner', 'keeper'],
  'entry:record': ['owner', 'keeper', 'helper'],
  'entry:correct': ['owner', 'keeper'],
  'photo:remove': ['owner', 'keeper'],
  'lineage:see': ['owner', 'keeper', 'helper', 'viewer'],
  'parentage:write': ['owner', 'keeper'],
  'plan:write': ['owner', 'keeper'],
  'sheet:see': ['owner', 'keeper', 'helper', 'viewer'],
  'sheet:issue': ['owner', 'keeper'],
  'sheet:withdraw': ['owner'],
  'key:manage': ['owner'],
  'task:see': ['owner', 'keeper', 'helper', 'viewer'],
  'task:write': ['owner', 'keeper', 'helper'],
  'catch:see': ['owner', 'keeper'],
  'hand:over': ['owner', 'keeper'],
  'sale:write': ['owner'],
  'money:see': ['owner'],
  'buyer:see': ['owner'],
  'audit:see': ['owner', 'keeper'],
  'data:export': ['owner'],
  'data:import': ['owner'],
} satisfies Record<string, readonly Role[]>;

export type Action = keyof typeof MAY;

export const may = (role: Role, action: Action): boolean => (MAY[action] as readonly Role[]).includes(role);

/** How a role is explained where one is chosen. */
export const ROLE_WORDS: Record<Role, { name: string; says: string }> = {
  owner: { name: 'Owner', says: 'Runs the fishroom: strains, pairings, prices, orders, money, members.' },
  keeper: { name: 'Keeper', says: 'Records everything in the room and corrects entries. Does not see money.' },
  helper: { name: 'Helper', says: 'Records what was seen and done. Cannot rewrite other people’s entries or sell.' },
  viewer: { name: 'Viewer', says: 'Reads everything but money and buyers. Writes nothing.' },
};
