import { gzipSync } from 'node:zlib';
import { type APIRequestContext, type Page } from '@playwright/test';
import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { getDesk } from '../../src/features/episodes/server/get-desk.ts';
import { withdrawEpisode } from '../../src/features/episodes/server/withdraw-episode.ts';
import { paths } from '../../src/paths.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { aKeptVideo, aShownBuild, aShownEpisode, BUILD } from '../support/companion.ts';
import { findBarriers, overhang, validateHtml } from '../support/e2e/page-checks.ts';
import { expect, test as base } from '../support/e2e/test.ts';
import { makeMedia } from '../support/media-samples.ts';
import { inWorkshop } from '../support/people.ts';

/** Of the scripts that come before anyone does anything, compressed: ARCHITECTURE.md, "Public pages". */
const SCRIPT_BUDGET = 15 * 1024;

interface Shown {
  readonly context: WorkshopContext;
  readonly episode: string;
  readonly fileId: string;
  readonly path: string;
}

const test = base.extend<object, { shown: Shown }>({
  shown: [
    async ({ product }, use) => {
      const owner = await product.owner('Wren Hallam', 'Marram Lane');
      const context = await inWorkshop(product.services, owner, owner.workshop);
      const parts = await aShownBuild(context);
      const build = await getBuild(context, { build: BUILD });
      const picture = ['-f', 'lavfi', '-i', 'testsrc2=size=320x180:rate=25:duration=60'];
      const coding = ['-c:v', 'libx264', '-preset', 'ultrafast', '-g', '25', '-pix_fmt', 'yuv420p'];
      const bytes = await makeMedia('episode.mp4', ...picture, ...coding, '-movflags', '+faststart');
      const fileId = await aKeptVideo(context, build.id, { seconds: 60, bytes });
      const episode = await aShownEpisode(context, parts, { fileId });
      await use({ context, episode, fileId, path: paths.episode(owner.workshop, BUILD, 1) });
    },
    { scope: 'worker', timeout: 60_000 },
  ],
});

const bench = (page: Page) => page.getByRole('region', { name: /On the bench at/ });

async function show(page: Page, seconds: number): Promise<void> {
  await page.locator('video').evaluate(async (video: HTMLVideoElement, at) => {
    if (video.readyState < 1) await new Promise((resolve) => (video.onloadedmetadata = resolve));
    video.currentTime = at;
  }, seconds);
}

test('the bench follows the video to the right part at the right frame', async ({ page, shown }) => {
  await page.goto(shown.path);
  await show(page, 19.98);
  await expect(bench(page).getByRole('heading')).toHaveText('On the bench at 0:19');
  await expect(bench(page).getByText('bearing housing')).toBeHidden();
  await show(page, 20.02);
  await expect(bench(page).getByRole('heading')).toHaveText('On the bench at 0:20');
  await expect(bench(page).locator('[aria-current]')).toContainText('bearing housing');
  await expect(page.locator('[data-note][aria-current]')).toContainText('The housing goes on.');
});

test('a part that came in earlier in the chapter stays, unfilled, and one of the chapter before goes', async ({
  page,
  shown,
}) => {
  await page.goto(`${shown.path}?t=12`);
  await expect(bench(page).getByRole('listitem')).toContainText('drum shaft');
  await page.getByRole('link', { name: '0:20', exact: true }).click();
  await expect(bench(page).getByRole('listitem')).toHaveCount(1);
  await expect(bench(page).getByRole('listitem')).toContainText('bearing housing');
});

test('an address with a time starts there, and a time can be copied as one', async ({
  page,
  shown,
  context,
}) => {
  await context.grantPermissions(['clipboard-read', 'clipboard-write']);
  await page.goto(`${shown.path}?t=41`);
  await expect(page.locator('[data-note][aria-current]')).toContainText('Let the pressure down');
  await expect
    .poll(() => page.locator('video').evaluate((video: HTMLVideoElement) => video.currentTime))
    .toBe(41);
  await page.getByRole('button', { name: 'Copy link to 0:41' }).click();
  await expect(bench(page).getByRole('status')).toHaveText('Link copied.');
  expect(await page.evaluate(() => navigator.clipboard.readText())).toBe(page.url());
});

test('where nothing may be copied the link is shown to be taken by hand', async ({ page, shown }) => {
  await page.addInitScript(() => {
    Object.defineProperty(navigator, 'clipboard', { value: undefined });
  });
  await page.goto(`${shown.path}?t=41`);
  await page.getByRole('button', { name: 'Copy link to 0:41' }).click();
  await expect(bench(page).getByLabel('Link to this moment')).toHaveValue(page.url());
});

test('the steel rule is moved by keys and by pointer', async ({ page, shown }) => {
  await page.goto(shown.path);
  const rule = page.getByRole('slider', { name: 'Time in the episode' });
  await rule.focus();
  await page.keyboard.press('PageUp');
  await page.keyboard.press('ArrowRight');
  await expect(rule).toHaveAttribute('aria-valuetext', '0:35 of 1:00');
  await page.keyboard.press('End');
  // The last frame begins a little before the end, and the video may be the last to say where it is.
  await expect(rule).toHaveAttribute('aria-valuenow', /^(59|60)$/);
  await page.keyboard.press('Home');
  await expect(rule).toHaveAttribute('aria-valuenow', '0');
  const scale = await rule.locator('svg').first().boundingBox();
  if (!scale) throw new Error('The rule is not there.');
  await page.mouse.move(scale.x + scale.width / 3, scale.y + 20);
  await page.mouse.down();
  await page.mouse.move(scale.x + scale.width / 2, scale.y + 20);
  await page.mouse.up();
  await expect(rule).toHaveAttribute('aria-valuetext', /^0:(29|30) of 1:00$/);
});

test('on a narrow screen a tap on the tape leads to its time', async ({ page, shown }) => {
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto(shown.path);
  const row = page.locator('[data-note]', { hasText: 'The housing goes on.' });
  await row.scrollIntoViewIfNeeded();
  const box = await row.boundingBox();
  if (!box) throw new Error('The row is not there.');
  await page.mouse.click(30, box.y + 26);
  await expect(row).toHaveAttribute('aria-current', 'true');
  await expect(page.getByRole('group').filter({ hasText: 'on the bench' }).first()).toContainText('118');
});

test('the reader’s units are kept over a reload', async ({ page, shown }) => {
  await page.goto(shown.path);
  const size = page.locator('[data-note]', { hasText: 'Face the shaft' });
  await expect(size).toContainText('412 mm [16 7/32 in]', { useInnerText: true });
  await page.getByText('inch', { exact: true }).click();
  await expect(size).toContainText('16 7/32 in', { useInnerText: true });
  await expect(size).not.toContainText('412 mm', { useInnerText: true });
  await page.reload();
  await expect(page.getByRole('radio', { name: 'inch' })).toBeChecked();
  await expect(size).not.toContainText('412 mm', { useInnerText: true });
  await page.getByRole('link', { name: 'For print' }).click();
  await expect(page.getByText('16 7/32 in')).toBeVisible();
  await expect(page.getByText('412 mm', { exact: true })).toBeHidden();
});

test('without scripts everything can be read, and a time leads into the video', async ({
  browser,
  shown,
}) => {
  const plain = await browser.newContext({
    javaScriptEnabled: false,
    baseURL: process.env['PUBLIC_URL'] ?? '',
  });
  const page = await plain.newPage();
  await page.goto(shown.path);
  await expect(page.getByText('Before you do this')).toBeVisible();
  await expect(page.getByRole('listitem').filter({ hasText: 'Seats came out' })).toContainText(
    '1-1/2 in [38.1 mm]',
    { useInnerText: true },
  );
  await expect(page.getByRole('link', { name: '0:20', exact: true })).toHaveAttribute(
    'href',
    `${paths.media(shown.fileId, 'video')}#t=20`,
  );
  await expect(page.getByText('On the bench at')).toBeHidden();
  await expect(page.getByRole('radio')).toHaveCount(0);
  await expect(page.getByRole('heading', { name: 'Parts in this episode' })).toBeVisible();
  await plain.close();
});

test('the page with everything on it is in order on any screen', async ({ page, shown, request }) => {
  const html = await (await request.get(shown.path)).text();
  expect(await validateHtml(html)).toEqual([]);
  expect(html).not.toMatch(/\sstyle=/);
  for (const width of [1440, 390]) {
    await page.setViewportSize({ width, height: 844 });
    for (const colorScheme of ['light', 'dark'] as const) {
      await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' });
      await page.goto(`${shown.path}?t=41`);
      await expect(page.locator('[data-note][aria-current]')).toHaveCount(1);
      expect(await findBarriers(page, 'all'), `${String(width)} ${colorScheme}`).toEqual([]);
    }
    expect(await overhang(page)).toBe(0);
  }
});

test('captions come from our own origin and are kept like the page', async ({ request, shown }) => {
  const html = await (await request.get(shown.path)).text();
  const source = /<track [^>]*src="([^"]+)"/.exec(html)?.[1] ?? '';
  const answer = await request.get(source);
  expect(answer.headers()['content-type']).toBe('text/vtt; charset=utf-8');
  expect(await answer.text()).toContain('one-one-eight');
  const again = await request.get(source, { headers: { 'if-none-match': answer.headers()['etag'] ?? '' } });
  expect(again.status()).toBe(304);
});

test('a feed is kept, and asked again costs no bytes', async ({ request, shown }) => {
  const feed = paths.buildFeed(shown.context.workshop.slug, BUILD);
  const answer = await request.get(feed);
  expect(answer.headers()['content-type']).toBe('application/rss+xml; charset=utf-8');
  expect(await answer.text()).toContain(`urn:uuid:${shown.episode}`);
  const again = await request.get(feed, { headers: { 'if-none-match': answer.headers()['etag'] ?? '' } });
  expect(again.status()).toBe(304);
});

test('numbers that are none lead nowhere, and others to their one address', async ({ request, shown }) => {
  const other = await request.get(shown.path.replace(/1$/, '01'), { maxRedirects: 0 });
  expect(other.status()).toBe(404);
  for (const number of ['0', '99', 'x', '1e1']) {
    expect((await request.get(shown.path.replace(/1$/, number))).status(), number).toBe(404);
  }
});

test('an episode that was withdrawn is not there from that moment on', async ({ request, product }) => {
  const owner = await product.owner('Idris Cole', 'Withdrawn');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const address = 'https://video.example/watch/2';
  const episode = await aShownEpisode(context, await aShownBuild(context), { address, length: '1:00' });
  const path = paths.episode(owner.workshop, BUILD, 1);
  expect((await request.get(path)).status()).toBe(200);
  const { version } = (await getDesk(context, { build: BUILD, episode })).episode;
  await withdrawEpisode(context, { build: BUILD, episode, version });
  await expect.poll(async () => (await request.get(path)).status()).toBe(404);
});

/** The scripts of a page with all that they import, each once. */
async function scriptsOf(request: APIRequestContext, html: string): Promise<string[]> {
  const inline = [...html.matchAll(/<script(?![^>]*(?:src=|json))[^>]*>([^]*?)<\/script>/g)].map(
    ([, text = '']) => text,
  );
  const wanted = [...html.matchAll(/(?:src|href)="(\/_astro\/[^"]+\.js)"/g)].map(([, src = '']) => src);
  const loaded = new Map<string, string>();
  for (let next = wanted.pop(); next !== undefined; next = wanted.pop()) {
    if (loaded.has(next)) continue;
    const text = await (await request.get(next)).text();
    loaded.set(next, text);
    for (const [, name = ''] of text.matchAll(/from\s*"\.\/([^"]+\.js)"|import\s*"\.\/([^"]+\.js)"/g))
      if (name !== '') wanted.push(`/_astro/${name}`);
  }
  return [...inline, ...loaded.values()];
}

test('the page’s scripts stay within their budget, and React is none of them', async ({ request, shown }) => {
  const scripts = await scriptsOf(request, await (await request.get(shown.path)).text());
  const bytes = scripts.reduce((sum, script) => sum + gzipSync(script).length, 0);
  test.info().annotations.push({ type: 'script', description: `${String(bytes)} bytes, gzip` });
  expect(scripts.join('')).not.toMatch(/react/i);
  expect(bytes).toBeGreaterThan(2000);
  expect(bytes).toBeLessThanOrEqual(SCRIPT_BUDGET);
});
