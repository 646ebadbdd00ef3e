import { type Page } from '@playwright/test';
import { paths } from '../../src/paths.ts';
import { cutVideo, makeBuildFromList, writeNote } from '../support/e2e/maker-steps.ts';
import { expect, test } from '../support/e2e/test.ts';

async function show(page: Page, seconds: number): Promise<void> {
  await page.locator('video').evaluate(async (video: HTMLVideoElement, at) => {
    if (video.readyState < 1) await new Promise((resolve) => (video.onloadedmetadata = resolve));
    video.currentTime = at;
  }, seconds);
}

/** The film that an episode's page holds; whatever else came is given as it is. */
function filmOn(page: string): string {
  const films = new Set([...page.matchAll(/\/media\/([0-9a-f-]{36})\/video/g)].map(([, id = '']) => id));
  const whole = page.trimEnd().endsWith('</html>') && page.includes('The shaft goes in.');
  return whole && films.size === 1 ? ([...films][0] ?? '') : `not one whole edition: ${page.slice(0, 200)}`;
}

test('an owner and an editor take a build from a list of parts to a page that viewers follow, and replace it in one moment', async ({
  page: owner,
  product,
  signIn,
  openBrowser,
  request,
}, testInfo) => {
  test.slow();
  const maker = await product.owner('Wren Hallam', 'Marram Lane');
  const helper = await product.person('Bo Lind');
  await product.join(maker, helper, 'editor');
  await signIn(maker);
  const { workshop } = maker;

  await makeBuildFromList(owner, workshop);

  const editor = await (await openBrowser(helper)).newPage();
  await editor.goto(paths.files(workshop, 'press'));
  const [first, second] = [testInfo.outputPath('first-cut.mp4'), testInfo.outputPath('second-cut.mp4')];
  await editor
    .getByLabel('Choose files…')
    .setInputFiles([await cutVideo(first, 'testsrc2'), await cutVideo(second, 'testsrc')]);
  for (const name of ['first-cut.mp4', 'second-cut.mp4'])
    await expect(editor.getByRole('region', { name: 'Clips' }).getByRole('link', { name })).toBeVisible({
      timeout: 60_000,
    });
  await editor.goto(paths.episodes(workshop, 'press'));
  await editor.getByLabel('Title').fill('The drum shaft');
  await editor.getByRole('button', { name: 'Start the draft' }).click();
  await editor.getByLabel('A file kept here').selectOption({ label: 'first-cut.mp4' });
  await editor.getByRole('button', { name: 'Take this file' }).click();
  await expect(editor.getByText('of 0:16.00')).toBeVisible();
  await writeNote(editor, '0:02', 'The shaft goes in.', '117');
  await writeNote(editor, '0:08', 'The housing goes on.', '118');
  await expect(editor.getByText('Everything is saved.')).toBeVisible();
  const desk = editor.url();
  await editor.getByRole('link', { name: 'Publish…' }).click();
  await editor.getByRole('button', { name: 'Ask the owner to publish it' }).click();
  await expect(editor.getByRole('button', { name: 'Back to draft' })).toBeVisible();

  await owner.goto(paths.today(workshop));
  await owner.getByRole('link', { name: /The drum shaft/ }).click();
  await owner.getByRole('button', { name: 'Publish the episode' }).click();
  await expect(owner.getByRole('heading', { name: 'Replace what viewers see' })).toBeVisible();

  const shown = paths.episode(workshop, 'press', 1);
  const viewer = await (await openBrowser()).newPage();
  await viewer.goto(shown);
  const bench = viewer.getByRole('region', { name: /On the bench at/ });
  await show(viewer, 7.98);
  await expect(bench.getByRole('heading')).toHaveText('On the bench at 0:07');
  await expect(bench.locator('[aria-current]')).toContainText('drum shaft');
  await show(viewer, 8.02);
  await expect(bench.getByRole('heading')).toHaveText('On the bench at 0:08');
  await expect(bench.locator('[aria-current]')).toContainText('bearing housing');

  const before = filmOn(await (await request.get(shown)).text());
  await editor.goto(desk);
  await editor.getByLabel('A file kept here').selectOption({ label: 'second-cut.mp4' });
  await editor.getByRole('button', { name: 'Take this file' }).click();
  await expect(editor.getByLabel('A file kept here').locator(':checked')).toHaveText('second-cut.mp4');
  expect(filmOn(await (await request.get(shown)).text())).toBe(before);

  const polled: string[] = [];
  const polling = (async () => {
    do polled.push(filmOn(await (await request.get(shown)).text()));
    while (polled.at(-1) === before);
  })();
  await owner.goto(owner.url().replace(/\?.*/, ''));
  await owner.getByRole('button', { name: 'Publish the next edition' }).click();
  await polling;
  const after = polled.at(-1) ?? '';
  expect(after).toMatch(/^[0-9a-f-]{36}$/);
  expect(new Set(polled)).toEqual(new Set([before, after]));
  await viewer.reload();
  await show(viewer, 8.02);
  await expect(bench.locator('[aria-current]')).toContainText('bearing housing');
  expect(filmOn(await viewer.content())).toBe(after);
});
