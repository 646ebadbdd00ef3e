import { type Page } from '@playwright/test';
import { newAddress } from '../support/e2e/product.ts';
import { codeOf, confirmWithPassword, enterPassword, enterSignUp } from '../support/e2e/steps.ts';
import { PASSWORD } from '../support/people.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';

async function setUpSecondFactor(page: Page): Promise<string> {
  await page.getByLabel('Your password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Start' }).click();
  const key = await page.getByText('Or type this key into it').getByRole('code').innerText();
  await expect(page.getByRole('img', { name: 'QR code for your app' })).toBeVisible();
  await page.getByLabel('Code', { exact: true }).fill(codeOf(key));
  await page.getByRole('button', { name: 'Turn it on' }).click();
  return key;
}

test('a maker signs up, opens a workshop, takes on an editor and changes their role', async ({
  page,
  outbox,
  openBrowser,
}) => {
  test.slow();
  const owner = { name: 'Maud Tregear', email: newAddress('maud') };
  const editor = { name: 'Piet Loman', email: newAddress('piet') };

  await page.goto('/');
  await page.getByRole('link', { name: 'Start a workshop' }).click();
  await enterSignUp(page, owner.name, owner.email);
  await expect(page.getByRole('heading', { name: 'Check your mail' })).toBeVisible();
  await confirmWithPassword(page, linkIn(await outbox.messageTo(owner.email), '/confirm'));

  await page.getByRole('link', { name: 'Make a workshop' }).first().click();
  await page.getByLabel('Name', { exact: true }).fill('Quay Shed');
  await page.getByLabel('Address name').fill(newAddress('quay-shed').replace(/@.*/, ''));
  await page.getByRole('button', { name: 'Make the workshop' }).click();
  await expect(page.getByRole('heading', { name: 'Second factor' })).toBeVisible();
  const key = await setUpSecondFactor(page);
  await expect(page.getByRole('heading', { name: 'Today' })).toBeVisible();

  await page.getByRole('link', { name: 'Team', exact: true }).click();
  await page.getByLabel('E-mail address').fill(editor.email);
  await page.getByLabel('As').selectOption('editor');
  await page.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(page.getByRole('heading', { name: 'Invited, not here yet' })).toBeVisible();
  const invitation = linkIn(await outbox.messageTo(editor.email), '/invitations/');

  const theirs = await (await openBrowser()).newPage();
  await theirs.goto(invitation);
  await theirs.getByRole('link', { name: 'Sign up' }).click();
  const { id: invited } = await outbox.messageTo(editor.email);
  await enterSignUp(theirs, editor.name, editor.email);
  await expect(theirs.getByRole('heading', { name: 'Check your mail' })).toBeVisible();
  await confirmWithPassword(theirs, linkIn(await outbox.messageTo(editor.email, invited), '/confirm'));
  await expect(theirs.getByRole('heading', { name: 'Workshops' })).toBeVisible();
  await theirs.goto(invitation);
  await theirs.getByRole('button', { name: 'Join the team' }).click();
  await expect(theirs.getByRole('heading', { name: 'Today' })).toBeVisible();

  await page.reload();
  await page.getByLabel(`Role of ${editor.name}`).selectOption('moderator');
  await page
    .getByRole('listitem')
    .filter({ hasText: editor.name })
    .getByRole('button', { name: 'Change' })
    .click();
  await expect(page.getByLabel(`Role of ${editor.name}`)).toHaveValue('moderator');
  await theirs.reload();
  await expect(theirs.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await enterPassword(theirs, editor.email);
  await expect(theirs.getByRole('heading', { name: 'Today' })).toBeVisible();

  const second = await (await openBrowser()).newPage();
  await second.goto('/account');
  await enterPassword(second, owner.email);
  await second.getByLabel('Code', { exact: true }).fill(codeOf(key, 1));
  await second.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(second.getByRole('heading', { name: owner.name })).toBeVisible();
  await page.goto('/account');
  await page.getByRole('button', { name: 'Sign out everywhere' }).click();
  await expect(page.getByRole('link', { name: 'Sign in' }).first()).toBeVisible();
  await second.reload();
  await expect(second.getByRole('heading', { name: 'Sign in' })).toBeVisible();
});
