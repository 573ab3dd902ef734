import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type Browser, type BrowserContext, chromium, type Page } from 'playwright-core';

/** The product as it is started for people: a process of its own, the web export, real files, a local mail sink. */
export type Running = { origin: string; process: ChildProcess; log: string[]; stop(): Promise<void> };

let nextPort = 4300;

export async function startProduct(env: Record<string, string> = {}): Promise<Running> {
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-journey-'));
  nextPort += 1;
  const port = nextPort + (process.pid % 500);
  const origin = `http://localhost:${port}`;
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    env: {
      ...process.env,
      NODE_ENV: 'development',
      PORT: String(port),
      ORIGIN: origin,
      DATA_FOLDER: join(folder, 'data'),
      UPLOADS_FOLDER: join(folder, 'uploads'),
      WEB_FOLDER: 'dist',
      DEMO: '0',
      LOG_LEVEL: 'warn',
      ...env,
    },
  });
  const log: string[] = [];
  child.stdout?.on('data', (chunk: Buffer) => log.push(chunk.toString()));
  child.stderr?.on('data', (chunk: Buffer) => log.push(chunk.toString()));
  await waitFor(async () => (await fetch(`${origin}/healthz`)).ok, log);
  return {
    origin,
    process: child,
    log,
    stop: async () => {
      const gone = new Promise((done) => child.once('exit', done));
      child.kill('SIGTERM');
      await gone;
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

async function waitFor(ready: () => Promise<boolean>, log: string[]): Promise<void> {
  for (let i = 0; i < 300; i += 1) {
    if (await ready().catch(() => false)) return;
    await new Promise((later) => setTimeout(later, 100));
  }
  throw new Error(`The product did not start:\n${log.join('')}`);
}

export const BROWSER_ARGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export function openBrowser(): Promise<Browser> {
  return chromium.launch({ executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium', args: BROWSER_ARGS });
}

export const PHONE = { width: 390, height: 844 };
export const WIDE = { width: 1280, height: 800 };

export type Visitor = { page: Page; context: BrowserContext; violations: string[]; broken: string[] };

/** A person's own browser; what the content security policy refused, and what broke, is kept. */
export async function visitorAt(
  browser: Browser,
  viewport: typeof PHONE,
  theme: 'light' | 'dark' = 'light',
): Promise<Visitor> {
  const context = await browser.newContext({
    viewport,
    locale: 'en-GB',
    colorScheme: theme,
    reducedMotion: 'reduce',
    acceptDownloads: true,
  });
  const page = await context.newPage();
  page.setDefaultTimeout(10_000);
  const violations: string[] = [];
  const broken: string[] = [];
  await page.exposeFunction('tellViolation', (text: string) => violations.push(text));
  await page.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      const tell: unknown = Reflect.get(window, 'tellViolation');
      if (typeof tell === 'function') tell(`${event.violatedDirective} ${event.blockedURI}`);
    });
  });
  page.on('pageerror', (error) => broken.push(error.message));
  return { page, context, violations, broken };
}

/** The newest letter to an address, out of the local sink. */
export async function letterTo(
  origin: string,
  email: string,
  subject: RegExp,
): Promise<{ subject: string; text: string }> {
  for (let i = 0; i < 150; i += 1) {
    const answer = await fetch(`${origin}/dev/letters.json?to=${encodeURIComponent(email)}`);
    const { letters }: { letters: { subject: string; text: string }[] } = await answer.json();
    const found = letters.findLast((letter) => subject.test(letter.subject));
    if (found) return found;
    await new Promise((later) => setTimeout(later, 200));
  }
  throw new Error(`No letter to ${email} about ${subject}`);
}
