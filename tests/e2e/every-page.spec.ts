import { mkdir } from 'node:fs/promises';
import { openState, pageRoutes, PAGES } from '../support/e2e/every-page.ts';
import {
  countStops,
  findBarriers,
  overhang,
  setWidth,
  validateHtml,
  walkByKeyboard,
} from '../support/e2e/page-checks.ts';
import { expect, test as base } from '../support/e2e/test.ts';
import { makeWorld, type World } from '../support/e2e/world.ts';

const WIDTHS = [1440, 390];
const SCHEMES = ['light', 'dark'] as const;
/** Where to put a picture of every page, for looking at them: unset in ordinary runs. */
const PICTURES = process.env['PICTURES'];

const test = base.extend<object, { world: World }>({
  world: [async ({ product }, use) => use(await makeWorld(product)), { scope: 'worker' }],
});

test('every page of the product is in the list, and nothing else', () => {
  expect([...new Set(PAGES.map(({ route }) => route))].sort()).toEqual(pageRoutes().sort());
});

for (const state of PAGES) {
  const name = state.state === undefined ? state.route : `${state.route} (${state.state})`;

  test(`${name} can be used by everyone, on any screen`, async ({ page, world, signIn }) => {
    test.slow();
    if (state.as) await signIn(state.as(world));
    await page.emulateMedia({ reducedMotion: 'reduce' });
    const answer = await openState(page, state, world);
    const html = await answer.text();
    expect(await validateHtml(html)).toEqual([]);
    expect(html).not.toMatch(/\sstyle=/);
    expect(answer.headers()['content-security-policy']).toContain("script-src 'self'");

    for (const width of WIDTHS) {
      await setWidth(page, width);
      for (const colorScheme of SCHEMES) {
        await page.emulateMedia({ colorScheme });
        const here = `${String(width)} px, ${colorScheme}`;
        expect(await findBarriers(page, colorScheme === 'light' ? 'all' : 'colour'), here).toEqual([]);
        if (PICTURES !== undefined) await takePicture(`${name} ${here}`);
      }
      expect(await overhang(page), `pixels too wide at ${String(width)}`).toBe(0);
    }

    const wanted = await countStops(page);
    expect(await walkByKeyboard(page)).toEqual({ stops: wanted, unseen: [] });

    async function takePicture(of: string): Promise<void> {
      await mkdir(PICTURES ?? '', { recursive: true });
      await page.screenshot({ path: `${PICTURES ?? ''}/${of.replace(/[^\w]+/g, '-')}.png`, fullPage: true });
    }
  });
}
