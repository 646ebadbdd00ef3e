import { eq } from 'drizzle-orm';
import { videos } from '../../src/db/schema/episodes.ts';
import { paths } from '../../src/paths.ts';
import { announcePageChanges } from '../../src/server/http/page-changes.ts';
import { aShownBuild, aShownEpisode, BUILD } from '../support/companion.ts';
import { type Product } from '../support/e2e/product.ts';
import { expect, test as base } from '../support/e2e/test.ts';
import { type FakePlayer, startFakePlayer } from '../support/fake-player.ts';
import { inWorkshop } from '../support/people.ts';

const test = base.extend<object, { host: FakePlayer }>({
  host: [
    async ({ browserName: _browserName }, use) => {
      const host = await startFakePlayer();
      await use(host);
      host.close();
    },
    { scope: 'worker' },
  ],
});

/** A published episode whose video is at the fake host, which only tests may keep a video at. */
async function anEpisodeAt(product: Product, address: string): Promise<string> {
  const owner = await product.owner('Tove Askew', 'Elsewhere');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const video = { address: 'https://video.example/watch/1', length: '1:00' };
  const episode = await aShownEpisode(context, await aShownBuild(context), video);
  await context.db.update(videos).set({ address }).where(eq(videos.episodeId, episode));
  await announcePageChanges(context.db, [`episode:${episode}`]);
  return paths.episode(owner.workshop, BUILD, 1);
}

test('a video elsewhere loads on a click, and the page follows what its frame says', async ({
  page,
  product,
  host,
}) => {
  test.slow();
  const asked: string[] = [];
  page.on('request', (request) => asked.push(new URL(request.url()).origin));
  const answer = await page.goto(await anEpisodeAt(product, host.address()));
  const policy = answer?.headers()['content-security-policy'] ?? '';
  expect(/frame-src ([^;]*)/.exec(policy)?.[1]?.trim()).toBe(host.origin);
  expect(asked, 'before the click').not.toContain(host.origin);
  await page.getByRole('button', { name: /^Load the video from/ }).click();

  const frame = page.frameLocator('iframe');
  const bench = page.getByRole('region', { name: /On the bench at/ });
  await frame.getByLabel('Second').fill('20');
  await frame.getByLabel('Second').press('Enter');
  await expect(bench.locator('[aria-current]')).toContainText('bearing housing');
  await expect(page.locator('[data-note][aria-current]')).toContainText('The housing goes on.');

  // By key: a click just after scrolling may still be taken by the frame, which is drawn by another process.
  await page.getByRole('link', { name: '0:40', exact: true }).first().press('Enter');
  await expect(frame.getByText('Here: 40')).toBeVisible();
  await expect(bench.locator('[aria-current]')).toContainText('port adapter');
});

test('an address with a time starts the frame there', async ({ page, product, host }) => {
  test.slow();
  await page.goto(`${await anEpisodeAt(product, host.address())}?t=20`);
  await expect(page.locator('[data-note][aria-current]')).toContainText('The housing goes on.');
  await page.getByRole('button', { name: /^Load the video from/ }).click();
  await expect(page.frameLocator('iframe').getByText('Here: 20')).toBeVisible();
  expect(await page.locator('iframe').getAttribute('src')).toMatch(/#t=20$/);
  expect(await page.locator('iframe').getAttribute('sandbox')).toBe(
    'allow-scripts allow-same-origin allow-presentation',
  );
});

test('with a frame that says nothing, every time leads to the host’s own address', async ({
  page,
  product,
  host,
}) => {
  test.slow();
  const address = host.address(true);
  await page.goto(await anEpisodeAt(product, address));
  await page.getByRole('button', { name: /^Load the video from/ }).click();
  await expect(page.frameLocator('iframe').getByText('Here: 0')).toBeVisible();
  const time = page.getByRole('link', { name: '0:20', exact: true }).first();
  await expect(time).toHaveAttribute('href', `${address}#t=20`);
  await time.press('Enter');
  await expect(page).toHaveURL(`${address}#t=20`);
});
