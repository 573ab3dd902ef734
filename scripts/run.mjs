// One entry for npm start, dev, build, test, check, bench and the upkeep commands. Node's own modules only, so that it runs on a fresh clone.
import { spawn, spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

process.chdir(path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..'));
const env = {
  ...process.env,
  EXPO_NO_TELEMETRY: '1',
  EXPO_OFFLINE: '1',
  EXPO_NO_DEPENDENCY_VALIDATION: '1',
  BROWSER: 'none',
};
const bin = (name) => path.join('node_modules', '.bin', name);

/** Runs a command to its end; the whole run stops when it fails. */
function run(command, args, extra = {}) {
  const started = Date.now();
  const result = spawnSync(command, args, { stdio: 'inherit', env: { ...env, ...extra } });
  if (result.error) throw result.error;
  if (result.status !== 0) process.exit(result.status ?? 1);
  console.log(`· ${[path.basename(command), ...args].join(' ')} (${((Date.now() - started) / 1000).toFixed(1)} s)`);
}

/** Counts a check as one test, so that all of them are seen before the run fails. */
function check(name, command, args) {
  const started = Date.now();
  const result = spawnSync(command, args, { stdio: 'inherit', env });
  const passed = result.status === 0;
  console.log(`${passed ? '✓' : '✗'} ${name} (${((Date.now() - started) / 1000).toFixed(1)} s)`);
  return passed;
}

const isThere = (command) => spawnSync(command, ['--version'], { stdio: 'ignore' }).status === 0;

/** What must be on the machine before npm can do the rest, with a clear word for what is missing. */
function checkMachine() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  const missing = [];
  if (major < 20 || (major === 20 && minor < 19))
    missing.push(`Node.js 20.19 or newer (this is ${process.versions.node})`);
  if (!isThere('npm')) missing.push('npm');
  if (!existsSync('node_modules/better-sqlite3/build')) {
    if (!isThere('python3')) missing.push('python3, which builds the database driver');
    if (!isThere('make')) missing.push('make, which builds the database driver');
    if (!isThere('g++') && !isThere('c++') && !isThere('clang++')) missing.push('a C++ compiler, such as g++');
  }
  if (missing.length === 0) return;
  console.error(`Kinwater needs:\n${missing.map((line) => `  - ${line}`).join('\n')}`);
  console.error('On Debian or Ubuntu: apt-get install -y python3 make g++');
  process.exit(1);
}

function hashOf(paths) {
  const hash = createHash('sha256');
  const add = (file) => {
    if (!existsSync(file)) return;
    if (statSync(file).isDirectory()) for (const name of readdirSync(file).sort()) add(path.join(file, name));
    else hash.update(file).update(readFileSync(file));
  };
  paths.forEach(add);
  return hash.digest('hex');
}
const stamped = (file, hash) => existsSync(file) && readFileSync(file, 'utf8') === hash;

function install() {
  const hash = hashOf(['package-lock.json', 'package.json']);
  const stamp = path.join('node_modules', '.install-stamp');
  if (stamped(stamp, hash)) return;
  run('npm', ['ci', '--no-audit', '--no-fund']);
  writeFileSync(stamp, hash);
}

const WEB_SOURCES = [
  'app',
  'features',
  'components',
  'hooks',
  'shared',
  'assets',
  'public',
  'scripts',
  'app.json',
  'metro.config.js',
  'tsconfig.json',
  'package-lock.json',
];

function build() {
  const hash = hashOf(WEB_SOURCES);
  const stamp = path.join('dist', '.stamp');
  if (stamped(stamp, hash)) return;
  run(bin('expo'), ['export', '--platform', 'web'], { CI: '1', NODE_ENV: 'production' });
  run(process.execPath, ['scripts/build-sw.mjs', 'dist']);
  run(process.execPath, ['scripts/precompress.mjs', 'dist']);
  writeFileSync(stamp, hash);
}

const DEBIAN = ['chromium', 'poppler-utils'];

/** The browser and the PDF reader of the tests; Debian's, since nothing may be downloaded from elsewhere. */
function browser() {
  const at = process.env.CHROMIUM ?? '/usr/bin/chromium';
  if (existsSync(at) && existsSync('/usr/bin/pdftotext')) return;
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) {
    console.error(`The tests need Chromium (looked at ${at}; set CHROMIUM to its path) and poppler-utils.`);
    process.exit(1);
  }
  run('apt-get', ['update', '-qq']);
  run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...DEBIAN], { DEBIAN_FRONTEND: 'noninteractive' });
}

/** Runs a vitest project; answers [passed, failed]. */
function vitest(project) {
  const report = path.join('build', `vitest-${project}.json`);
  mkdirSync('build', { recursive: true });
  const result = spawnSync(
    bin('vitest'),
    ['run', '--project', project, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
    { stdio: 'inherit', env },
  );
  const told = existsSync(report) ? JSON.parse(readFileSync(report, 'utf8')) : { numPassedTests: 0, numFailedTests: 1 };
  return [told.numPassedTests, Math.max(told.numFailedTests, result.status === 0 ? 0 : 1)];
}

/** Types of each layer, format and lint, import rules, unused code. */
function checks() {
  run(bin('expo'), ['customize', 'tsconfig.json']);
  const results = [
    check('types: app', bin('tsc'), ['--noEmit']),
    check('types: shared', bin('tsc'), ['-p', 'shared/tsconfig.json', '--noEmit']),
    check('types: server', bin('tsc'), ['-p', 'server/tsconfig.json', '--noEmit']),
    check('types: tests', bin('tsc'), ['-p', 'tests/tsconfig.json', '--noEmit']),
    check('format and lint', bin('biome'), ['check', '.']),
    check('import cycles', bin('depcruise'), ['app', 'features', 'components', 'hooks', 'shared', 'server']),
    check('packages named', bin('knip'), ['--no-progress', '--include', 'unlisted,unresolved,binaries']),
  ];
  return [results.filter(Boolean).length, results.filter((passed) => !passed).length];
}

function serve(watch) {
  const watching = watch ? ['--watch-path=server', '--watch-path=shared'] : [];
  return spawn(process.execPath, [...watching, '--import', 'tsx', 'server/main.ts'], { stdio: 'inherit', env });
}

/** Keeps the children until one ends or this process is told to stop. */
function hold(children) {
  const stop = (signal, except) => {
    for (const child of children) if (child !== except) child.kill(signal);
  };
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => stop(signal));
  // npm's shell does not pass SIGTERM on: when it goes, this process is left with another parent, and stops too.
  const parent = process.ppid;
  if (process.env.npm_lifecycle_event) setInterval(() => process.ppid !== parent && stop('SIGTERM'), 500).unref();
  for (const child of children) {
    child.on('exit', (code) => {
      stop('SIGTERM', child);
      process.exitCode = code ?? 0;
    });
  }
}

/** Several [passed, failed] as the run's last line. */
function conclude(...results) {
  const [passed, failed] = [0, 1].map((i) => results.reduce((sum, result) => sum + result[i], 0));
  console.log(`${passed} passed, ${failed} failed`);
  process.exit(failed > 0 ? 1 : 0);
}

const task = process.argv[2];
checkMachine();
install();
if (task === 'build') build();
else if (task === 'start') {
  build();
  hold([serve(false)]);
} else if (task === 'dev') {
  // Metro on 8081 passes /api, /dev and pictures on to Express on 3000 (metro.config.js).
  const port = process.env.DEV_PORT ?? '8081';
  process.env.ORIGIN ??= `http://localhost:${port}`;
  env.ORIGIN = process.env.ORIGIN;
  hold([serve(true), spawn(bin('expo'), ['start', '--web', '--port', port], { stdio: 'inherit', env })]);
} else if (task === 'check') conclude(checks());
else if (['backup', 'restore', 'doctor'].includes(task))
  run(process.execPath, ['--import', 'tsx', 'server/command.ts', ...process.argv.slice(2)]);
else if (task === 'bench') run(process.execPath, ['--import', 'tsx', 'scripts/bench.ts', ...process.argv.slice(3)]);
else if (task === 'journeys' || task === 'test') {
  browser();
  const before = task === 'test' ? [checks(), vitest('unit')] : [];
  build();
  conclude(...before, vitest('journeys'));
} else {
  console.error('usage: node scripts/run.mjs start|dev|build|check|test|journeys|bench|backup|restore|doctor');
  process.exit(2);
}
