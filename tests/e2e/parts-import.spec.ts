import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { listParts } from '../../src/features/parts/server/list-parts.ts';
import { expect, test } from '../support/e2e/test.ts';
import { inWorkshop } from '../support/people.ts';

for (const javaScriptEnabled of [true, false]) {
  test.describe(javaScriptEnabled ? 'with scripts' : 'without scripts', () => {
    test.use({ javaScriptEnabled });

    test('a list from a spreadsheet is matched, put right and taken in whole', async ({
      page,
      product,
      signIn,
    }) => {
      const owner = await product.owner('Wren', 'Press shed');
      const context = await inWorkshop(product.services, owner, owner.workshop);
      await makeBuild(context, { name: 'Press', slug: 'press', about: '', plannedEpisodes: null });
      await signIn(owner);
      await page.goto(`/bench/${owner.workshop}/press/parts`);
      await page.getByRole('link', { name: 'Take in a list…' }).click();
      const buffer = Buffer.from('Item;What it is;Qty\n101;base rail;2\n102;upright;two\n', 'utf16le');
      const name = 'parts.csv';
      await page.getByLabel('A file').setInputFiles({
        name,
        mimeType: 'text/csv',
        buffer: Buffer.concat([Buffer.from([0xff, 0xfe]), buffer]),
      });
      await page.getByRole('button', { name: 'Read the list' }).click();

      await expect(page.getByText('UTF-16')).toBeVisible();
      await expect(page.getByLabel('Number', { exact: true })).toHaveValue('0');
      await page.getByLabel('Name', { exact: true }).selectOption('1');
      await page.getByRole('button', { name: 'Look it over' }).click();
      await expect(page.getByRole('row', { name: /102/ })).toContainText('Needed says “two”');
      await expect(page.getByRole('button', { name: /^Take/ })).toHaveCount(0);
      expect((await listParts(context, { build: 'press' })).items).toEqual([]);

      await page.getByText('The list as it was read').click();
      await page.getByLabel('Rows').fill('Item;What it is;Qty\n101;base rail;2\n102;upright;2\n');
      await page.getByRole('button', { name: 'Look it over again' }).click();
      await page.getByRole('button', { name: 'Take 2 parts in' }).click();
      await expect(page.getByText('2 added, 0 updated.')).toBeVisible();
      const { items } = await listParts(context, { build: 'press' });
      expect(items.map(({ number, quantity }) => [number, quantity])).toEqual([
        ['101', 2],
        ['102', 2],
      ]);
    });
  });
}
