import { readdirSync, readFileSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { expect, test } from 'vitest';

/** Who may import whom. `self` is the importer's own second-level folder. Everything else is forbidden. */
const MAY_IMPORT: Record<string, string[]> = {
  shared: ['shared'],
  server: ['server', 'shared'],
  hooks: ['hooks', 'shared'],
  components: ['components', 'hooks', 'shared', 'assets'],
  features: ['self', 'features/call', 'features/entries', 'components', 'hooks', 'shared', 'assets'],
  app: ['features', 'components', 'hooks', 'shared/roles'],
};

/** Packages a layer may use besides React's own; `shared` and the server's are lists, the browser's are a ban. */
const SHARED_MAY = ['zod/mini', '@dagrejs/dagre', 'simple-statistics'];
const SERVER_ONLY = [
  'express',
  'kysely',
  'better-sqlite3',
  'sharp',
  'multer',
  'nodemailer',
  'pino',
  'stripe',
  'pdfkit',
];
/** In the reader's browser a sheet's signature is verified: the one place outside the server that knows jose. */
const JOSE_OUTSIDE_SERVER = 'features/sheets/';

const FORBIDDEN_NAMES = /(^|\/)(utils?|helpers?|lib|common|types|managers?|services?)(\/|\.tsx?$)/;

const files = Object.keys(MAY_IMPORT).flatMap((layer) =>
  readdirSync(layer, { recursive: true, encoding: 'utf8' })
    .filter((name) => /\.tsx?$/.test(name))
    .map((name) => `${layer}/${name}`),
);

/** Static and dynamic imports, and re-exports. */
const IMPORTS = [
  /^import\s(?:[^'"]*?\sfrom\s)?'([^']+)'/gm,
  /^export\s(?:type\s)?[{*][^'"]*?\sfrom\s'([^']+)'/gm,
  /\bimport\('([^']+)'\)/g,
];
const targetsOf = (text: string): string[] =>
  IMPORTS.flatMap((pattern) => [...text.matchAll(pattern)].map(([, target = '']) => target));

const pathOf = (file: string, target: string): string | null =>
  target.startsWith('.') ? join(dirname(file), target) : target.startsWith('@/') ? target.slice(2) : null;

test.each(files)('%s keeps to its layer', (file) => {
  const text = readFileSync(file, 'utf8');
  const [layer = '', feature = ''] = file.split('/');
  const allowed = (MAY_IMPORT[layer] ?? []).map((to) => (to === 'self' ? `${layer}/${feature}` : to));
  // Files directly in `features` (call, entries) are the browser's plumbing and may use each other and the queue.
  if (layer === 'features' && !file.slice('features/'.length).includes('/')) allowed.push('features');
  for (const target of targetsOf(text)) {
    const path = pathOf(file, target);
    if (path !== null)
      expect(
        allowed.some((to) => path === to || path.startsWith(`${to}/`)),
        `${file} -> ${path}`,
      ).toBe(true);
    else judgePackage(file, layer, target);
  }
  expect(file, 'a drawer without a name of its own').not.toMatch(FORBIDDEN_NAMES);
});

function judgePackage(file: string, layer: string, target: string): void {
  if (layer === 'shared') expect(SHARED_MAY, `${file} -> ${target}`).toContain(target);
  if (layer !== 'server') {
    expect(
      SERVER_ONLY.some((name) => target === name || target.startsWith(`${name}/`)),
      `${file} -> ${target}`,
    ).toBe(false);
    if (target === 'jose') expect(file.startsWith(JOSE_OUTSIDE_SERVER), `${file} -> jose`).toBe(true);
    if (target === 'yup') expect(file).toBe('components/form/zodAsYup.ts');
    if (layer !== 'shared') expect(target, `${file}: zod/mini, or the bundle grows by 100 kB`).not.toBe('zod');
  }
}

test.each(files.filter((file) => /^(app|features|hooks)\//.test(file)))(
  '%s leaves raw Text, TextInput and Button to components',
  (file) => {
    const raw = /import \{([^}]*)\} from 'react-native'/.exec(readFileSync(file, 'utf8'))?.[1] ?? '';
    const names = raw.split(',').map((name) => name.trim());
    for (const name of ['Text', 'TextInput', 'Button']) expect(names, `${file} imports ${name}`).not.toContain(name);
  },
);

test.each(files.filter((file) => file.startsWith('server/')))('%s enters other features by their door', (file) => {
  const [, own = ''] = file.split('/');
  const houses = ['http', 'db', 'mail', 'pictures', own];
  for (const target of targetsOf(readFileSync(file, 'utf8'))) {
    const path = pathOf(file, target);
    const [layer, feature = '', inner] = (path ?? '').split('/');
    if (layer !== 'server' || inner === undefined || houses.includes(feature)) continue;
    // `entries.ts` is a feature's second door: what its kinds of entry do, gathered by server/record.
    const byDoor =
      inner === 'index' || (own === 'record' && inner === 'entries') || (inner === 'kinds' && feature === 'record');
    expect(byDoor, `${file} -> ${path}`).toBe(true);
  }
});
