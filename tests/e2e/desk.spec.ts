import { type Page } from '@playwright/test';
import { makeBuild } from '../../src/features/builds/server/make-build.ts';
import { makeEpisode } from '../../src/features/episodes/server/make-episode.ts';
import { setVideo } from '../../src/features/episodes/server/set-video.ts';
import { listAppearances } from '../../src/features/notes/server/list-appearances.ts';
import { listNotes } from '../../src/features/notes/server/list-notes.ts';
import { paths } from '../../src/paths.ts';
import { aShownBuild, aShownEpisode, BUILD, noteAt } from '../support/companion.ts';
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

const A_MINUTE = { fileId: null, address: 'https://video.example/watch/1', length: '1:00' };

/** A draft of a minute in a build with three parts, with an owner and an editor. */
async function aTeamsDesk(product: Product) {
  const owner = await product.owner('Wilma Stanhope', 'Dune Shed');
  const editor = await product.person('Bo Lind');
  await product.join(owner, editor, 'editor');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const parts = await aShownBuild(context);
  const { id: episode } = await makeEpisode(context, { build: BUILD, title: 'The shaft' });
  const ref = { build: BUILD, episode };
  await setVideo(context, { ...ref, ...A_MINUTE });
  return { owner, editor, context, parts, ref, desk: paths.desk(owner.workshop, BUILD, episode) };
}

async function openDesk(page: Page, desk: string): Promise<void> {
  await page.goto(desk);
  await expect(page.getByRole('button', { name: 'Keys' })).toBeVisible();
}

/** What the browser says of a request that a lost connection took, or that met a newer version. */
function forgive(complaints: string[], said: RegExp): void {
  complaints.splice(0, complaints.length, ...complaints.filter((complaint) => !said.test(complaint)));
}

test('who wrote without a connection sees both texts when someone else saved meanwhile, and nothing is lost', async ({
  page,
  context: connection,
  product,
  signIn,
  openBrowser,
  complaints,
}) => {
  test.slow();
  const { owner, editor, context, ref, desk } = await aTeamsDesk(product);
  await noteAt(context, ref.episode, 0, { text: 'Face the shaft.' });
  await signIn(editor);
  await openDesk(page, desk);
  await page.getByRole('button', { name: 'Change the note at 0:00' }).click();
  await connection.setOffline(true);
  await page.keyboard.type(' By hand.');
  await expect(page.getByText('No connection.', { exact: true })).toBeVisible();

  const other = await (await openBrowser(owner)).newPage();
  await openDesk(other, desk);
  await other.getByRole('button', { name: 'Change the note at 0:00' }).click();
  await other.keyboard.type(' On the lathe.');
  await other.keyboard.press('Control+Enter');
  await expect(other.getByText('Everything is saved.')).toBeVisible();

  await connection.setOffline(false);
  const both = page.getByRole('alert').filter({ hasText: 'Someone else saved this in the meantime' });
  await expect(both).toContainText('Face the shaft. By hand.');
  await expect(both).toContainText('Face the shaft. On the lathe.');
  await expect(page.getByText('No connection.', { exact: true })).toBeHidden();
  await both.getByRole('button', { name: 'Take mine' }).click();
  await expect(page.getByText('Everything is saved.')).toBeVisible();
  const notes = other.getByRole('region', { name: 'Notes' });
  await expect(notes.getByText('Face the shaft. By hand.')).toBeVisible();
  forgive(complaints, /ERR_INTERNET_DISCONNECTED|409 \(Conflict\)/);
});

test('a question to one person waits in their Today, holds the episode back, and is answered on the desk', async ({
  page,
  product,
  signIn,
  openBrowser,
}) => {
  const { owner, editor, desk } = await aTeamsDesk(product);
  await signIn(editor);
  await openDesk(page, desk);
  await page.keyboard.press('n');
  await page.keyboard.type('14 or 40?');
  const composer = page.getByRole('region', { name: 'New note' });
  await composer.getByText('One person, asked').click();
  await composer.getByLabel('Who is asked').selectOption({ label: owner.name });
  await composer.getByRole('button', { name: 'Save the note' }).click();
  await expect(page.getByText('Everything is saved.')).toBeVisible();
  const checks = page.locator('#checks');
  await expect(checks).toContainText(`${owner.name} has a question to answer at 0:00.`);
  const publish = await page.context().newPage();
  await publish.goto(`${desk}/publish`);
  await expect(publish.getByRole('button', { name: 'Ask the owner to publish it' })).toBeDisabled();

  const other = await (await openBrowser(owner)).newPage();
  await other.goto(paths.today(owner.workshop));
  await other.getByRole('link', { name: /You are asked: “14 or 40\?”/ }).click();
  await other.getByLabel('Your answer').fill('14, as the plan says.');
  await other.getByRole('button', { name: 'Answer', exact: true }).click();
  await expect(other.getByText(`${owner.name} answered: 14, as the plan says.`)).toBeVisible();
  await other.goto(paths.today(owner.workshop));
  await expect(other.getByText('Nothing waits for you')).toBeVisible();

  // The editor's desk is as it was opened; it hears of the answer by itself.
  await expect(page.getByText(`${owner.name} answered: 14, as the plan says.`)).toBeVisible();
  await expect(checks).toContainText('Nothing waits for an answer.');
  await publish.reload();
  await publish.getByRole('button', { name: 'Ask the owner to publish it' }).click();
  await expect(publish.getByRole('button', { name: 'Back to draft' })).toBeVisible();
});

test('on a published episode an editor proposes a number, and viewers see it when the owner takes it', async ({
  page,
  product,
  signIn,
  openBrowser,
  request,
}) => {
  const { owner, editor, context, parts } = await aTeamsDesk(product);
  const episode = await aShownEpisode(context, parts, { address: A_MINUTE.address, length: '1:00' });
  const shown = async () => (await request.get(paths.episode(owner.workshop, BUILD, 2))).text();
  await signIn(editor);
  await openDesk(page, paths.desk(owner.workshop, BUILD, episode));
  await expect(page.getByRole('button', { name: 'Change the note at 0:01' })).toHaveCount(0);
  await page.getByRole('button', { name: 'Propose another text for the note at 0:01' }).click();
  const words = page.getByRole('region', { name: 'New note' }).getByLabel('Words');
  await expect(words).toHaveValue('Face the shaft to 412 mm.');
  await words.fill('Face the shaft to 411 mm.');
  await words.press('Control+Enter');
  const sentence = 'Proposed by Bo Lind; viewers do not see it';
  await expect(page.getByText(`${sentence} until the owner takes it.`)).toBeVisible();
  expect(await shown()).not.toContain('411');

  const other = await (await openBrowser(owner)).newPage();
  await openDesk(other, paths.desk(owner.workshop, BUILD, episode));
  await other.getByRole('button', { name: 'Take it' }).click();
  await expect(other.getByText(sentence)).toBeHidden();
  await expect.poll(shown).toContain('411');
  await expect(page.getByText(sentence)).toBeHidden();
});

test('the rule is moved by drag, by keys and by tap, and a part is put on the bench from in to out', async ({
  page,
  product,
  signIn,
}) => {
  const { editor, context, parts, ref, desk } = await aTeamsDesk(product);
  await signIn(editor);
  await openDesk(page, desk);
  const rule = page.getByRole('slider', { name: 'Moment in the episode' });
  await expect(rule).toHaveAttribute('aria-valuetext', '0:00.000');
  const scale = await rule.locator('svg').first().boundingBox();
  if (!scale) throw new Error('The rule is not there.');
  const [middle, at] = [scale.y + 20, (share: number) => scale.x + scale.width * share];
  await page.mouse.move(at(0.1), middle);
  await page.mouse.down();
  await page.mouse.move(at(0.25), middle);
  await page.mouse.move(at(0.5), middle);
  await page.mouse.up();
  await expect(rule).toHaveAttribute('aria-valuetext', /^0:(29\.9|30\.0)/);
  await page.mouse.move(at(0.9), middle);
  await expect(rule).toHaveAttribute('aria-valuetext', /^0:(29\.9|30\.0)/);

  await rule.focus();
  await page.keyboard.press('Home');
  await page.keyboard.press('PageUp');
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('Shift+ArrowRight');
  await page.keyboard.press('ArrowLeft');
  await expect(rule).toHaveAttribute('aria-valuetext', '0:20.000');
  await page.keyboard.press('i');

  const finger = await page.context().newCDPSession(page);
  const touchPoints = [{ x: at(0.75), y: middle }];
  await finger.send('Input.dispatchTouchEvent', { type: 'touchStart', touchPoints });
  await finger.send('Input.dispatchTouchEvent', { type: 'touchEnd', touchPoints: [] });
  await expect(rule).toHaveAttribute('aria-valuetext', /^0:(44\.9|45\.0)/);
  await page.keyboard.press('o');
  await page.keyboard.press('p');
  const bench = page.getByRole('region', { name: 'On the bench by hand' });
  await expect(bench.getByRole('combobox', { name: 'Part' })).toBeFocused();
  await page.keyboard.type('bearing');
  await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  await page.keyboard.press('Enter');
  await expect(bench.getByRole('listitem')).toContainText('bearing housing');
  await expect(page.getByText('Everything is saved.')).toBeVisible();
  const [set] = (await listAppearances(context, ref)).items;
  expect(set).toMatchObject({ partId: parts.get('118'), position: { frame: 20_000 } });
  await bench.getByRole('button', { name: 'Take 118 off the bench' }).click();
  await expect(bench.getByRole('listitem')).toHaveCount(0);
  await expect.poll(async () => (await listAppearances(context, ref)).items).toEqual([]);
});

test('who pauses after a word goes on writing after its space', async ({ page, product, signIn }) => {
  const { editor, context, ref, desk } = await aTeamsDesk(product);
  await noteAt(context, ref.episode, 0, { text: 'Face' });
  await signIn(editor);
  await openDesk(page, desk);
  await page.getByRole('button', { name: 'Change the note at 0:00' }).click();
  await page.keyboard.type(' it ');
  await expect
    .poll(async () => (await listNotes(context, ref)).items.map(({ text }) => text))
    .toEqual(['Face it']);
  await expect(page.getByText('Everything is saved.')).toBeVisible();
  await page.keyboard.type('square.');
  await expect
    .poll(async () => (await listNotes(context, ref)).items.map(({ text }) => text))
    .toEqual(['Face it square.']);
});
