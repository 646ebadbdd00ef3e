import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { paths } from '../../src/paths.ts';
import { findBarriers } from '../support/e2e/page-checks.ts';
import { type Product } from '../support/e2e/product.ts';
import { expect, test } from '../support/e2e/test.ts';
import { inWorkshop } from '../support/people.ts';

async function aDesk(product: Product) {
  const owner = await product.owner('Wilma Stanhope', 'Dune Shed');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const build = 'press';
  await makeBuild(context, { name: 'Press', slug: build, about: '', plannedEpisodes: null });
  const { id } = await makeEpisode(context, { build, title: 'The shaft' });
  return { owner, desk: paths.desk(owner.workshop, build, id) };
}

test('a maker writes, undoes and changes notes by keyboard', async ({ page, product, signIn }) => {
  const { owner, desk } = await aDesk(product);
  await signIn(owner);
  await page.goto(desk);
  await expect(page.getByRole('button', { name: 'Keys' })).toBeVisible();
  const notes = page.getByRole('region', { name: 'Notes' }).getByRole('listitem');

  await page.keyboard.press('Shift+ArrowRight');
  await page.keyboard.press('2');
  await expect(page.getByRole('region', { name: 'New note' }).getByLabel('Words')).toBeFocused();
  await page.keyboard.type('Seats came out at 35.009 mm.');
  await page.keyboard.press('Control+Enter');
  await expect(notes).toHaveCount(1);
  await expect(page.getByText('Everything is saved.')).toBeVisible();

  await page.keyboard.press('Escape');
  await page.keyboard.press('Control+z');
  await expect(notes).toHaveCount(0);
  await page.keyboard.press('Control+Shift+z');
  await expect(notes).toHaveCount(1);

  await page.keyboard.press('e');
  await expect(notes.getByLabel('Words')).toBeFocused();
  await page.keyboard.type(' Both.');
  await page.keyboard.press('Control+Enter');
  await expect(page.getByText('Everything is saved.')).toBeVisible();
  expect(await findBarriers(page, 'all')).toEqual([]);

  await page.reload();
  await expect(notes.getByText('Seats came out at 35.009 mm. Both.')).toBeVisible();
});

test('what is being written survives a reload', async ({ page, product, signIn }) => {
  const { owner, desk } = await aDesk(product);
  await signIn(owner);
  await page.goto(desk);
  await expect(page.getByRole('button', { name: 'Keys' })).toBeVisible();
  await page.keyboard.press('n');
  await page.keyboard.type('Half a thought');
  await expect(page.getByText('Not saved yet; kept in this tab.')).toBeVisible();
  await page.reload();
  await expect(page.getByRole('region', { name: 'New note' }).getByLabel('Words')).toHaveValue(
    'Half a thought',
  );
});
