// npm run pictures: the pictures of README.md, taken of the demo in a copy started for it.
import { spawn } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { type Browser, chromium, type Page } from '@playwright/test';
import { TOTP } from 'otpauth';
import sharp from 'sharp';
import { paths } from '../src/paths.ts';
import { type DemoAccount, findDemoAccounts } from './demo.ts';
import { findFreePort } from './ports.ts';

const ROOT = fileURLToPath(new URL('..', import.meta.url));
const FOLDER = join(ROOT, 'docs/pictures');
const WORKSHOP = 'marram-lane';
const BUILD = 'orchard-press';
const WIDE = { width: 1440, height: 1100 };
const NARROW = { width: 390, height: 1100 };
/** A second of episode 4 at which the bearing housings are on the bench. */
const AT = 37;

interface Picture {
  readonly name: string;
  readonly viewport: { readonly width: number; readonly height: number };
  readonly signedIn?: boolean;
  /** Leads there from the front page. */
  readonly open: (page: Page) => Promise<unknown>;
}

const companion = async (page: Page) => {
  await page.goto(paths.episode(WORKSHOP, BUILD, 4, AT));
  await page.waitForFunction(() => {
    const video = document.querySelector('video');
    return video !== null && video.readyState >= 2 && !video.seeking && video.currentTime > 1;
  });
};

const PICTURES: readonly Picture[] = [
  {
    name: 'front-door',
    viewport: { ...WIDE, height: 900 },
    open: (page) => page.goto(paths.workshop(WORKSHOP)),
  },
  { name: 'companion', viewport: WIDE, open: companion },
  { name: 'companion-narrow', viewport: NARROW, open: companion },
  {
    name: 'today',
    viewport: { ...WIDE, height: 480 },
    signedIn: true,
    open: (page) => page.goto(paths.today(WORKSHOP)),
  },
  {
    name: 'desk',
    viewport: WIDE,
    signedIn: true,
    open: async (page) => {
      await page.goto(paths.today(WORKSHOP));
      await page
        .getByRole('main')
        .getByRole('link', { name: /14 or 40/ })
        .click();
      await page.waitForURL(/\/episodes\//);
      const video = page.locator('video');
      await video.evaluate((element: HTMLVideoElement) => (element.currentTime = 8));
      await page.waitForFunction(() => {
        const found = document.querySelector('video');
        return found !== null && found.readyState >= 3 && !found.seeking && found.currentTime > 1;
      });
      await page.evaluate(() => scrollTo(0, 0));
    },
  },
  {
    name: 'parts',
    viewport: { ...WIDE, height: 900 },
    signedIn: true,
    open: (page) => page.goto(paths.parts(WORKSHOP, BUILD)),
  },
];

async function take(
  browser: Browser,
  url: string,
  owner: DemoAccount,
  colorScheme: 'light' | 'dark',
  folder: string,
) {
  const context = await browser.newContext({
    baseURL: url,
    locale: 'en-GB',
    colorScheme,
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  for (const { name, viewport, signedIn, open } of PICTURES) {
    if (signedIn === true && (await context.cookies()).length === 0) await signIn(page, owner);
    await page.setViewportSize(viewport);
    await open(page);
    await page.evaluate(() => document.fonts.ready.then(() => undefined));
    await sharp(await page.screenshot())
      .webp({ quality: 84, effort: 6 })
      .toFile(join(folder, `${name}.webp`));
  }
  await context.close();
}

async function signIn(page: Page, { email = '', password = '', secondFactorKey = '' }: DemoAccount) {
  await page.goto(paths.signIn());
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page
    .getByRole('textbox', { name: 'Code', exact: true })
    .fill(new TOTP({ secret: secondFactorKey }).generate());
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.waitForURL(/\/bench/);
}

async function startCopy(dataDir: string, port: number) {
  const child = spawn(process.execPath, ['scripts/start.mjs', '--throwaway'], {
    cwd: ROOT,
    env: { ...process.env, DATA_DIR: dataDir, PORT: String(port), DEMO: '1' },
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
  });
  const ended = new Promise<void>((resolve) => child.once('close', () => resolve()));
  await new Promise<void>((resolve, reject) => {
    child.once('message', () => resolve());
    void ended.then(() => reject(new Error('The copy did not start.')));
  });
  return async () => {
    child.kill('SIGTERM');
    await ended;
  };
}

const folder = process.argv[2] ?? FOLDER;
const scheme = process.argv[3] === 'dark' ? 'dark' : 'light';
const dataDir = mkdtempSync(join(tmpdir(), 'pictures-'));
const port = await findFreePort();
const stop = await startCopy(dataDir, port);
try {
  mkdirSync(folder, { recursive: true });
  const owner = findDemoAccounts(dataDir).find(({ who }) => who === 'owner');
  if (!owner) throw new Error('The demo has no owner.');
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
  await take(browser, `http://127.0.0.1:${String(port)}`, owner, scheme, folder);
  await browser.close();
} finally {
  await stop();
  rmSync(dataDir, { recursive: true });
}
