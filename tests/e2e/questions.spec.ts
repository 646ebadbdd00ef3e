import { paths } from '../../src/paths.ts';
import { aShownBuild, aShownEpisode, BUILD } from '../support/companion.ts';
import { newAddress } from '../support/e2e/product.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';
import { inWorkshop } from '../support/people.ts';
import { ask } from '../support/questions.ts';

const NARROW = { width: 390, height: 844 };
const ASKED = 'Is the housing strong enough for a bigger drum?';

test('a question goes from a moment through mail, the queue and a draft to the owner’s answer', async ({
  page,
  product,
  openBrowser,
  outbox,
}) => {
  test.slow();
  const owner = await product.owner('Wren Hallam', 'Marram Lane');
  const [moderator, editor] = [await product.person('Tove Askew'), await product.person('Idris Cole')];
  await product.join(owner, moderator, 'moderator');
  await product.join(owner, editor, 'editor');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const parts = await aShownBuild(context);
  await aShownEpisode(context, parts, { address: 'https://video.example/watch/1', length: '1:00' });
  const episode = paths.episode(owner.workshop, BUILD, 1);
  const email = newAddress('pia');

  await page.goto(`${episode}?t=22`);
  await expect(page.getByRole('heading', { name: 'Ask about 0:22' })).toBeVisible();
  await page.getByLabel('Your question').fill(ASKED);
  await page.getByRole('button', { name: 'Go on with the question' }).click();
  await expect(page.getByLabel('At the moment')).toHaveValue('0:22');
  await expect(page.getByLabel('118 bearing housing')).toBeChecked();
  await page.getByLabel('Name to show with it').fill('Pia');
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Send the question' }).click();
  await expect(page.getByText('We have sent a link to that address.')).toBeVisible();
  await page.goto(linkIn(await outbox.messageTo(email), '/questions/'));
  await page.getByRole('button', { name: 'Send the question' }).click();
  await expect(page.getByText('The workshop looks your question over.')).toBeVisible();

  const phone = await (await openBrowser(moderator)).newPage();
  await phone.setViewportSize(NARROW);
  await phone.goto(paths.questions(owner.workshop));
  await expect(phone.getByText('risky: load')).toBeVisible();
  const show = phone.getByRole('button', { name: 'Show' });
  const box = await show.boundingBox();
  expect(box?.height).toBeGreaterThanOrEqual(56);
  expect(box?.y).toBeGreaterThan(NARROW.height * 0.8);
  await show.click();
  await expect(phone.getByText('Nothing waits to be sorted')).toBeVisible();

  const desk = await (await openBrowser(editor)).newPage();
  await desk.goto(paths.questions(owner.workshop, 'unanswered'));
  await desk.getByRole('link', { name: ASKED }).click();
  await expect(desk.getByRole('button', { name: 'Send the answer' })).toBeHidden();
  await desk.getByLabel('Draft of the answer').fill('I think so.');
  await desk.getByRole('button', { name: 'Save the draft' }).click();
  await expect(desk.getByText('drafted')).toBeVisible();

  const maker = await (await openBrowser(owner)).newPage();
  await maker.goto(paths.today(owner.workshop));
  await maker.getByRole('link', { name: `A drafted answer waits for you: “${ASKED}”` }).click();
  const answer = maker.getByRole('textbox', { name: /^Answer/ });
  await expect(answer).toHaveValue('I think so.');
  await answer.fill('**No.** It is drawn for this drum alone.');
  await maker.getByRole('button', { name: 'Send the answer' }).click();
  await expect(maker.getByText('It is drawn for this drum alone.').first()).toBeVisible();
});

test('one key shows a question, and another marks one urgent', async ({ page, product, signIn }) => {
  const owner = await product.owner('Wren Hallam', 'Marram Lane');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  await aShownBuild(context);
  const viewer = await inWorkshop(product.services, await product.person('Sam'), owner.workshop);
  await ask(viewer, { text: 'Which grease is on it?' });
  await ask(viewer, { text: 'Where is the drawing?' });
  await signIn(owner);
  await page.goto(paths.questions(owner.workshop));
  await expect(page.getByText('Which grease is on it?')).toBeVisible();
  await page.keyboard.press('s');
  await expect(page.getByText('Which grease is on it?')).toBeHidden();
  await page.keyboard.press('u');
  await expect(page.getByText('urgent', { exact: true })).toBeVisible();
});
