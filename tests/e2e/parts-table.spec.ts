import { type Page } from '@playwright/test';
import { newId } from '../../src/db/columns.ts';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { addPart } from '../../src/features/parts/server/add-part.ts';
import { changePart } from '../../src/features/parts/server/change-part.ts';
import { listParts } from '../../src/features/parts/server/list-parts.ts';
import { saveParts } from '../../src/features/parts/server/save-parts.ts';
import { PartInput } from '../../src/features/parts/part.ts';
import { type Product } from '../support/e2e/product.ts';
import { expect, test } from '../support/e2e/test.ts';
import { inWorkshop } from '../support/people.ts';

const BUILD = 'press';
const fields = (number: string, name: string) => PartInput.parse({ number, name });

async function aBuild(product: Product) {
  const owner = await product.owner('Wren', 'Press shed');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  await makeBuild(context, { name: 'Press', slug: BUILD, about: '', plannedEpisodes: null });
  return { owner, context, address: `/bench/${owner.workshop}/${BUILD}/parts` };
}

const cell = (page: Page, row: number, column: number) =>
  page.getByRole('grid', { name: 'Parts' }).getByRole('row').nth(row).getByRole('gridcell').nth(column);

async function isSaved(page: Page): Promise<void> {
  await expect(page.getByRole('status').filter({ hasText: 'Everything is saved.' })).toBeVisible();
}

test('parts are typed, pasted, put right and taken back by keyboard alone', async ({
  page,
  context: browser,
  product,
  signIn,
}) => {
  const { owner, context, address } = await aBuild(product);
  await browser.grantPermissions(['clipboard-read', 'clipboard-write']);
  await signIn(owner);
  await page.goto(address);
  await cell(page, 1, 0).focus();
  await page.keyboard.type('101');
  await page.keyboard.press('Tab');
  await page.keyboard.type('base rail');
  await page.keyboard.press('Tab');
  await page.keyboard.type('b');
  await page.keyboard.press('Tab');
  await page.keyboard.type('2');
  await page.keyboard.press('Enter');
  await isSaved(page);
  await expect(cell(page, 1, 2)).toHaveText('bought');

  await page.evaluate(() =>
    navigator.clipboard.writeText('102\tupright\tmade\t2\n103\thead beam\n104\tgusset\tx\t8\n'),
  );
  await page.keyboard.press('Home');
  await expect(cell(page, 2, 0)).toBeFocused();
  await page.keyboard.press('Control+v');
  await expect(cell(page, 4, 1)).toHaveText('gusset');
  await expect(cell(page, 4, 2)).toContainText('Enter made, bought or salvaged.');
  await expect(cell(page, 4, 2)).toContainText('x');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.type('salvaged');
  await page.keyboard.press('Enter');
  await isSaved(page);
  const numbers = async () => (await listParts(context, { build: BUILD })).items.map(({ number }) => number);
  await expect.poll(numbers).toEqual(['101', '102', '103', '104']);

  await page.keyboard.press('Control+z');
  await page.keyboard.press('Control+z');
  await expect(page.getByRole('status').filter({ hasText: 'Undone: paste 3 rows.' })).toBeVisible();
  await expect.poll(numbers).toEqual(['101']);
  await page.keyboard.press('Control+Shift+z');
  await page.keyboard.press('Control+Shift+z');
  await expect.poll(numbers).toEqual(['101', '102', '103', '104']);

  await page.reload();
  await expect(cell(page, 4, 2)).toHaveText('salvaged');
});

test('a part that someone else saved meanwhile shows both texts and lets one choose', async ({
  page,
  product,
  signIn,
  complaints,
}) => {
  const { owner, context, address } = await aBuild(product);
  const { id } = await addPart(context, { ...fields('1', 'rail'), build: BUILD });
  await signIn(owner);
  await page.goto(address);
  await expect(cell(page, 1, 1)).toHaveText('rail');
  await changePart(context, { ...fields('1', 'their rail'), build: BUILD, part: id, version: 1 });
  await cell(page, 1, 1).focus();
  await page.keyboard.press('F2');
  await page.keyboard.type(' of mine');
  await page.keyboard.press('Enter');
  const both = page.getByRole('alert');
  await expect(both).toContainText('their rail');
  await expect(both).toContainText('rail of mine');
  await both.getByRole('button', { name: 'Take what I entered' }).click();
  await isSaved(page);
  const [part] = (await listParts(context, { build: BUILD })).items;
  expect(part).toMatchObject({ name: 'rail of mine', version: 3 });
  // The browser itself says when an answer is 409, which is what was wanted here.
  expect(complaints.splice(0)).toEqual([expect.stringContaining('409')]);
});

test('in a list of 500 parts typing redraws only its own row', async ({ page, product, signIn }) => {
  test.slow();
  const { owner, context, address } = await aBuild(product);
  const changes = Array.from({ length: 500 }, (_, at) => {
    const number = String(at + 1);
    return { do: 'add' as const, id: newId(), fields: PartInput.parse({ number, name: `part ${number}` }) };
  });
  await saveParts(context, { build: BUILD, changes });
  await signIn(owner);
  await page.goto(address);
  await expect(cell(page, 500, 1)).toHaveText('part 500');
  await page.evaluate(() => {
    const rows = new Set<number>();
    Object.assign(globalThis, { redrawn: rows });
    new MutationObserver((records) => {
      for (const { target } of records) {
        const element = target instanceof Element ? target : target.parentElement;
        const row = element?.closest('tr');
        if (row) rows.add(row.rowIndex);
      }
    }).observe(document.querySelector('[role=grid]') ?? document.body, {
      subtree: true,
      childList: true,
      characterData: true,
      attributes: true,
    });
  });
  await cell(page, 250, 1).focus();
  await page.keyboard.type('by another name');
  await page.keyboard.press('Enter');
  await isSaved(page);
  await expect(cell(page, 250, 1)).toHaveText('by another name');
  const redrawn = await page.evaluate(() => [...(globalThis as unknown as { redrawn: Set<number> }).redrawn]);
  // The row where the focus was at first, the one that is typed in, and the one that Enter goes on to.
  expect(redrawn.sort((a, b) => a - b)).toEqual([1, 250, 251]);
});

test.describe('without scripts', () => {
  test.use({ javaScriptEnabled: false });

  test('parts are added, changed and deleted by forms', async ({ page, product, signIn }) => {
    const { owner, address } = await aBuild(product);
    await signIn(owner);
    await page.goto(`${address}?add=1`);
    await page.getByLabel('Number', { exact: true }).fill('101');
    await page.getByLabel('Name', { exact: true }).fill('base rail');
    await page.getByRole('button', { name: 'Add the part' }).click();
    await page.getByLabel('Number', { exact: true }).fill('101');
    await page.getByLabel('Name', { exact: true }).fill('another');
    await page.getByRole('button', { name: 'Add the part' }).click();
    await expect(page.getByLabel('Number', { exact: true })).toHaveAccessibleDescription(
      /taken by “base rail”/,
    );
    await expect(page.getByLabel('Name', { exact: true })).toHaveValue('another');
    await page.getByRole('link', { name: 'Change part 101' }).click();
    await page.getByLabel('Needed').fill('2');
    await page.getByRole('button', { name: 'Save the part' }).click();
    await expect(page.getByRole('row', { name: /101 base rail made 2/ })).toBeVisible();
    await page.getByRole('link', { name: 'Change part 101' }).click();
    await page.getByRole('button', { name: 'Delete part 101' }).click();
    await page.getByRole('button', { name: 'Undo' }).click();
    await expect(page.getByRole('row', { name: /101 base rail/ })).toBeVisible();
  });
});
