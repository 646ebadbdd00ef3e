import { paths } from '../../src/paths.ts';
import { publishedEpisode } from '../support/audience.ts';
import { inWorkshop } from '../support/people.ts';
import { newAddress } from '../support/e2e/product.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';

test('a reader asks for the next episode, the owner announces it, and the reader leaves', async ({
  page,
  product,
  outbox,
  openBrowser,
}) => {
  const owner = await product.owner('Wren Hallam', 'Sandbank Shed');
  const context = await inWorkshop(product.services, owner, owner.workshop);
  const { build, episode } = await publishedEpisode(context);
  const email = newAddress('reader');

  await page.goto(paths.build(owner.workshop, build));
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Mail me the next episode' }).click();
  await expect(page.getByRole('heading', { name: 'Look in your mail' })).toBeVisible();
  const asked = await outbox.messageTo(email);
  await page.goto(linkIn(asked, '/subscriptions/'));
  await page.getByRole('button', { name: 'Yes, mail me' }).click();
  await expect(page.getByText('You are on the list.')).toBeVisible();

  const desk = await (await openBrowser(owner)).newPage();
  await desk.goto(paths.publish(owner.workshop, build, episode));
  await desk.getByRole('link', { name: 'See the announcement' }).click();
  await desk.getByLabel('Above the rest').fill('It turns!');
  await desk.getByRole('button', { name: 'Keep it and see the mail' }).click();
  await expect(desk.getByText('is out: The drum shaft')).toContainText('It turns!');
  const send = desk.getByRole('button', { name: 'Mail it to 1 subscriber' });
  await send.click();
  await expect(desk.getByText('Look whether the video can be watched').first()).toBeVisible();
  await desk.getByLabel('anyone can watch the video').check();
  await send.click();
  const mail = await outbox.messageTo(email, asked.id);
  expect(mail.text).toContain('It turns!');
  await expect(desk.getByText('1 of 1 sent')).toBeVisible({ timeout: 30_000 });

  await page.goto(linkIn(mail, '/subscriptions/'));
  await page.getByRole('button', { name: 'Mail me no more' }).click();
  await expect(page.getByText('You are off the list.')).toBeVisible();
});
