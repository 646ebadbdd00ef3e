import { getBuild } from '../../src/features/builds/server/get-build.ts';
import { listStages } from '../../src/features/builds/server/list-stages.ts';
import { getDesk } from '../../src/features/episodes/server/get-desk.ts';
import { listEpisodes } from '../../src/features/episodes/server/list-episodes.ts';
import { paths } from '../../src/paths.ts';
import { aKeptVideo, aShownBuild, BUILD, CAPTIONS, noteAt } from '../support/companion.ts';
import { newAddress } from '../support/e2e/product.ts';
import { enterPassword, enterSignUp } from '../support/e2e/steps.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';
import { inWorkshop } from '../support/people.ts';

test.use({ javaScriptEnabled: false });

test('without scripts the sign-up form says what is wrong at its field and keeps what was entered', async ({
  page,
}) => {
  const email = newAddress('brackets');
  await page.goto('/sign-up');
  await enterSignUp(page, 'Kit <Marsh>', email);
  await expect(page.getByRole('alert')).toContainText('One thing to put right');
  const name = page.getByLabel('Your name');
  await expect(name).toHaveValue('Kit <Marsh>');
  await expect(name).toHaveAttribute('aria-invalid', 'true');
  await expect(name).toHaveAccessibleDescription(/Leave out control characters and angle brackets/);
  await expect(page.getByLabel('E-mail address')).toHaveValue(email);
  await expect(page.getByLabel('Password')).toHaveValue('');
  await page.getByRole('link', { name: /Leave out control characters/ }).click();
  await expect(name).toBeFocused();
});

test('without scripts someone signs up, confirms, signs out and signs in', async ({ page, outbox }) => {
  test.slow();
  const email = newAddress('plain');
  await page.goto('/sign-up');
  await enterSignUp(page, 'Rosa Plain', email);
  await expect(page.getByRole('heading', { name: 'Check your mail' })).toBeVisible();
  await page.goto(linkIn(await outbox.messageTo(email), '/confirm'));
  await page.getByLabel('Password').fill('not-the-one-i-chose');
  await page.getByRole('button', { name: 'Confirm and sign in' }).click();
  await expect(page.getByLabel('Password')).toHaveAccessibleDescription(/That is not the password you chose/);
  await page.getByLabel('Password').fill('press-and-mill');
  await page.getByRole('button', { name: 'Confirm and sign in' }).click();
  await expect(page.getByRole('heading', { name: 'Workshops' })).toBeVisible();
  await page.getByRole('button', { name: 'Sign out' }).click();

  await page.goto('/sign-in');
  await enterPassword(page, email, 'wrong-one-altogether');
  await expect(page.getByRole('alert')).toContainText('That address and password do not go together.');
  await expect(page.getByLabel('E-mail address')).toHaveValue(email);
  await enterPassword(page, email);
  await expect(page.getByRole('heading', { name: 'Workshops' })).toBeVisible();
});

test('without scripts an editor puts stages in order, sees the files, and takes an episode to the owner', async ({
  page,
  product,
  signIn,
}) => {
  test.slow();
  const owner = await product.owner('Wren Hallam', 'Marram Lane');
  const editor = await product.person('Bo Lind');
  await product.join(owner, editor, 'editor');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  await aShownBuild(context);
  const { id: buildId } = await getBuild(context, { build: BUILD });
  await aKeptVideo(context, buildId, { seconds: 60 });
  await signIn(editor);

  await page.goto(paths.stages(owner.workshop, BUILD));
  for (const name of ['Mill', 'Frame']) {
    await page.getByLabel('Name').fill(name);
    await page.getByRole('button', { name: 'Add the stage' }).click();
    await expect(page.getByRole('heading', { name, exact: true })).toBeVisible();
  }
  await page.getByRole('button', { name: 'Move Frame up' }).click();
  await page.getByRole('link', { name: 'Change Mill' }).click();
  await page.getByLabel('Name').fill('Mill drum');
  await page.getByRole('button', { name: 'Save the stage' }).click();
  await page.getByRole('link', { name: 'Delete Mill drum' }).click();
  await page.getByRole('button', { name: 'Delete the stage' }).click();
  await page.getByRole('button', { name: 'Undo' }).click();
  await expect(page.getByRole('heading', { name: 'Mill drum' })).toBeVisible();
  const stages = (await listStages(context, { build: BUILD })).items.map(({ name }) => name);
  expect(stages).toEqual(['Frame', 'Mill drum']);

  await page.goto(paths.files(owner.workshop, BUILD));
  await expect(page.getByRole('region', { name: 'Files' })).toContainText('episode.mp4');

  await page.goto(paths.episodes(owner.workshop, BUILD));
  await page.getByLabel('Title').fill('The shaft');
  await page.getByRole('button', { name: 'Start the draft' }).click();
  const [episode] = (await listEpisodes(context, { build: BUILD })).items;
  const ref = { build: BUILD, episode: episode?.id ?? '' };
  await noteAt(context, ref.episode, 3, { text: 'Face the shaft.' });
  await page.getByLabel('Or an address elsewhere').fill('https://video.example/watch/1');
  await page.getByLabel('How long it is').fill('1:00');
  await page.getByRole('button', { name: 'Take this address' }).click();
  await expect(page.getByRole('listitem').filter({ hasText: 'Face the shaft.' })).toBeVisible();
  const details = page.locator('#details');
  await details.getByLabel('Title').fill('The drum shaft');
  await details.getByRole('button').click();
  const captions = page.locator('#captions');
  const file = { name: 'words.vtt', mimeType: 'text/vtt', buffer: Buffer.from(CAPTIONS) };
  await captions.getByLabel('Captions file').setInputFiles(file);
  await captions.getByRole('button', { name: 'Take the captions in' }).click();
  await expect(captions).toContainText('2 captions, en, from words.vtt');
  await page.getByRole('link', { name: 'Publish…' }).click();
  await page.getByRole('button', { name: 'Ask the owner to publish it' }).click();
  await expect(page.getByRole('button', { name: 'Back to draft' })).toBeVisible();
  expect((await getDesk(context, ref)).episode).toMatchObject({ state: 'ready', title: 'The drum shaft' });
});
