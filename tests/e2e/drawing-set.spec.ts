import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http';
import { type AddressInfo } from 'node:net';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { expect, type Page, test } from '@playwright/test';
import axe from 'axe-core';
import { HtmlValidate, StaticConfigLoader } from 'html-validate';
import sirv from 'sirv';

type Handler = (req: IncomingMessage, res: ServerResponse, next: () => void, locals: object) => Promise<void>;

const SHEETS = ['', '?layout=bench', '?layout=print'];
const SCHEMES = ['light', 'dark'] as const;

/** What React and Astro write differently from the validator's taste is still valid HTML. */
const VALIDATOR = new HtmlValidate(
  new StaticConfigLoader({
    root: true,
    extends: ['html-validate:recommended'],
    elements: ['html5'],
    rules: {
      'attr-case': 'off',
      'attribute-boolean-style': 'off',
      'attribute-empty-style': 'off',
      'doctype-style': 'off',
      'form-dup-name': ['error', { shared: ['radio', 'checkbox', 'button', 'submit'] }],
      'no-inline-style': 'error',
      'no-trailing-whitespace': 'off',
      'valid-id': ['error', { relaxed: true }],
      'void-style': 'off',
    },
  }),
);

let server: Server;
let origin: string;

// The product does not show this page; the built page server does when its locals ask for it.
test.beforeAll(async () => {
  const dist = join(import.meta.dirname, '../../dist');
  const { handler } = (await import(pathToFileURL(join(dist, 'server/entry.mjs')).href)) as {
    handler: Handler;
  };
  const statics = sirv(join(dist, 'client'));
  server = createServer((req, res) => {
    statics(req, res, () => {
      void handler(req, res, () => res.writeHead(404).end(), { parts: {}, showDrawingSet: true });
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  origin = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
});

test.afterAll(() => {
  server.closeAllConnections();
  server.close();
});

async function findViolations(page: Page): Promise<string[]> {
  await page.evaluate(axe.source);
  return page.evaluate(async () => {
    const { violations } = await (globalThis as unknown as { axe: typeof axe }).axe.run();
    return violations.flatMap(({ id, nodes }) => nodes.map(({ target }) => `${id}: ${target.join(' ')}`));
  });
}

for (const sheet of SHEETS) {
  // Paper is light.
  for (const colorScheme of sheet.endsWith('print') ? (['light'] as const) : SCHEMES) {
    test(`axe finds nothing on the drawing set${sheet}, ${colorScheme} @narrow`, async ({ page }) => {
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await page.goto(`${origin}/drawing-set${sheet}`);
      expect(await findViolations(page)).toEqual([]);
      const overhang = await page.evaluate(() => document.documentElement.scrollWidth - innerWidth);
      expect(overhang, 'pixels wider than the window').toBeLessThanOrEqual(0);
    });
  }

  test(`the drawing set${sheet} is valid HTML without style attributes`, async ({ request }) => {
    const html = await (await request.get(`${origin}/drawing-set${sheet}`)).text();
    const report = await VALIDATOR.validateString(html);
    expect(
      report.results.flatMap(({ messages }) =>
        messages.map(({ ruleId, message }) => `${ruleId}: ${message}`),
      ),
    ).toEqual([]);
  });
}

test('a dialog keeps focus and gives it back', async ({ page }) => {
  await page.goto(`${origin}/drawing-set`);
  const opener = page.getByRole('button', { name: 'Withdraw…' });
  await expect(page.getByRole('tab', { name: 'Sizes' })).toBeVisible();
  await opener.click();
  const dialog = page.getByRole('dialog', { name: 'Withdraw episode 4?' });
  await expect(dialog).toBeVisible();
  expect(await findViolations(page)).toEqual([]);
  await page.keyboard.press('Tab');
  await expect(dialog.locator(':focus')).toHaveCount(1);
  await page.keyboard.press('Escape');
  await expect(dialog).toBeHidden();
  await expect(opener).toBeFocused();
});

test('the type-ahead, the menu and a message are in order while they are open', async ({ page }) => {
  await page.goto(`${origin}/drawing-set`);
  const part = page.getByRole('combobox', { name: 'Part' });
  await expect(part).toHaveAttribute('aria-expanded', 'false');
  await part.click();
  await page.keyboard.press('ArrowDown');
  expect(await findViolations(page)).toEqual([]);
  await page.keyboard.press('Escape');
  await page.getByRole('button', { name: 'Say that it went wrong' }).click();
  await page.getByRole('button', { name: 'More' }).click();
  await expect(page.getByRole('menu')).toBeVisible();
  expect(await findViolations(page)).toEqual([]);
});

test('everything is there without a script', async ({ browser }) => {
  const context = await browser.newContext({ javaScriptEnabled: false });
  const page = await context.newPage();
  await page.goto(`${origin}/drawing-set`);
  await expect(page.getByText('Bore 72 H7')).toBeVisible();
  await expect(page.getByRole('combobox', { name: 'Part' })).toHaveValue('118');
  await context.close();
});
