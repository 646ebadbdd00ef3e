import { paths } from '../../src/paths.ts';
import { cutVideo, makeBuildFromList, writeNote } from '../support/e2e/maker-steps.ts';
import { newAddress } from '../support/e2e/product.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';

test('an owner, a moderator and two viewers go from a list of parts and a video to an answered question', async ({
  page: owner,
  product,
  signIn,
  openBrowser,
  outbox,
  request,
}, testInfo) => {
  test.slow();
  const maker = await product.owner('Hollin Crewe', 'Saltings Shed');
  const sorter = await product.person('Maren Voss');
  await product.join(maker, sorter, 'moderator');
  await signIn(maker);
  const { workshop } = maker;
  await makeBuildFromList(owner, workshop);

  const follower = await (await openBrowser()).newPage();
  const [following, asking] = [newAddress('follower'), newAddress('asker')];
  await follower.goto(paths.build(workshop, 'press'));
  await follower.getByLabel('E-mail address').fill(following);
  await follower.getByRole('button', { name: 'Mail me the next episode' }).click();
  await expect(follower.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
  const confirming = await outbox.messageTo(following);
  await follower.goto(linkIn(confirming, '/subscriptions/'));
  await follower.getByRole('button', { name: 'Yes, mail me' }).click();
  await expect(follower.getByText('You are on the list.')).toBeVisible();

  await owner.goto(paths.files(workshop, 'press'));
  const film = await cutVideo(testInfo.outputPath('film.mp4'), 'testsrc2');
  await owner.getByLabel('Choose files…').setInputFiles(film);
  await expect(
    owner.getByRole('region', { name: 'Clips' }).getByRole('link', { name: 'film.mp4' }),
  ).toBeVisible({ timeout: 60_000 });
  await owner.goto(paths.episodes(workshop, 'press'));
  await owner.getByLabel('Title').fill('The drum shaft');
  await owner.getByRole('button', { name: 'Start the draft' }).click();
  await owner.getByLabel('A file kept here').selectOption({ label: 'film.mp4' });
  await owner.getByRole('button', { name: 'Take this file' }).click();
  await expect(owner.getByText('of 0:16.00')).toBeVisible();
  await writeNote(owner, '0:08', 'The housing goes on.', '118');
  await expect(owner.getByText('Everything is saved.')).toBeVisible();
  await owner.getByRole('link', { name: 'Publish…' }).click();
  await owner.getByRole('button', { name: 'Publish the episode' }).click();
  await owner.getByRole('link', { name: 'See the announcement' }).click();
  await owner.getByRole('button', { name: 'Mail it to 1 subscriber' }).click();
  const told = await outbox.messageTo(following, confirming.id);
  expect(told.subject).toContain('The drum shaft');
  const shown = paths.episode(workshop, 'press', 1);
  expect(linkIn(told, '/w/')).toBe(shown);
  const feed = await (await request.get(paths.buildFeed(workshop, 'press'))).text();
  expect(feed).toContain('<title>The drum shaft</title>');
  expect(feed).toMatch(/<guid isPermaLink="false">urn:uuid:/);

  const asker = await (await openBrowser()).newPage();
  await asker.goto(`${shown}?t=9`);
  await asker.getByLabel('Your question').fill('What pressure is the relief valve set to?');
  await asker.getByRole('button', { name: 'Go on with the question' }).click();
  await expect(asker.getByRole('heading', { name: 'Ask about 0:09' })).toBeVisible();
  await expect(asker.getByRole('checkbox', { name: /bearing housing/ })).toBeChecked();
  await asker.getByLabel('Name to show with it').fill('Bram');
  await asker.getByLabel('E-mail address').fill(asking);
  await asker.getByRole('button', { name: 'Send the question' }).click();
  await expect(asker.getByText('Look in your mail.')).toBeVisible();
  const link = await outbox.messageTo(asking);
  await asker.goto(linkIn(link, '/questions/'));
  await asker.getByRole('button', { name: 'Send the question' }).click();
  await expect(asker.getByText('Sent.')).toBeVisible();

  const moderator = await (await openBrowser(sorter)).newPage();
  await moderator.setViewportSize({ width: 390, height: 800 });
  await moderator.goto(paths.questions(workshop));
  await expect(moderator.getByText('What pressure is the relief valve set to?')).toBeVisible();
  await moderator.getByRole('button', { name: 'Show' }).click();
  await expect(moderator.getByText('Nothing waits to be sorted')).toBeVisible();
  await moderator.goto(paths.questions(workshop, 'unanswered'));
  await moderator.getByRole('link', { name: /What pressure/ }).click();
  await expect(moderator.getByRole('button', { name: 'Send the answer' })).toHaveCount(0);
  await moderator.getByLabel('Draft of the answer').fill('165 bar, and sealed.');
  await moderator.getByRole('button', { name: 'Save the draft' }).click();

  await owner.goto(paths.today(workshop));
  await owner.getByRole('link', { name: /What pressure/ }).click();
  await expect(owner.getByRole('textbox', { name: /^Answer/ })).toHaveValue('165 bar, and sealed.');
  await owner.getByRole('button', { name: 'Send the answer' }).click();
  const answered = await outbox.messageTo(asking, link.id);
  expect(answered.text).toContain('165 bar, and sealed.');
  await follower.goto(shown);
  const there = follower
    .getByRole('listitem')
    .filter({ hasText: 'What pressure is the relief valve set to?' });
  await expect(there.last()).toContainText('165 bar, and sealed.');
  expect(await outbox.messages({ to: following })).toHaveLength(2);
});
