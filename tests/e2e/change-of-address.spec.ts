import { newAddress } from '../support/e2e/product.ts';
import { PASSWORD } from '../support/people.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';

test('an address changes once the old one approves and the new one confirms', async ({
  page,
  signIn,
  product,
  outbox,
}) => {
  test.slow();
  const person = await product.person('Osk Fenwick');
  const next = newAddress('osk-at-home');
  await signIn(person);
  await page.goto('/account');
  const form = page.getByRole('form', { name: 'Address' });
  await form.getByLabel('New e-mail address').fill(next);
  await form.getByLabel('Your password').fill(PASSWORD);
  await form.getByRole('button', { name: 'Change the address' }).click();
  await expect(page.getByRole('status')).toContainText('open the mail at your old one first');

  await page.goto(linkIn(await outbox.messageTo(person.email), '/account/new-address'));
  await page.getByRole('button', { name: 'Go on with the change' }).click();
  await expect(page.getByRole('status')).toContainText('Done.');
  await page.goto('/account');
  await expect(page.getByText(person.email)).toBeVisible();

  await page.goto(linkIn(await outbox.messageTo(next), '/account/new-address'));
  await page.getByRole('button', { name: 'Go on with the change' }).click();
  await expect(page.getByRole('status')).toContainText('Done.');
  await page.goto('/account');
  await expect(page.getByText(next)).toBeVisible();
});

test('a wrong password is said in the form that it was typed in', async ({ page, signIn, product }) => {
  await signIn(await product.person('Mo Carrick'));
  await page.goto('/account');
  const form = page.getByRole('form', { name: 'Address' });
  const next = newAddress('mo-at-home');
  await form.getByLabel('New e-mail address').fill(next);
  await form.getByLabel('Your password').fill('not-my-password-at-all');
  await form.getByRole('button', { name: 'Change the address' }).click();
  await expect(form.getByLabel('Your password')).toHaveAccessibleDescription('That is not your password.');
  await expect(form.getByLabel('New e-mail address')).toHaveValue(next);
  await expect(page.getByLabel('Password now')).toHaveAccessibleDescription('');
  await page.getByRole('alert').getByRole('link').click();
  await expect(form.getByLabel('Your password')).toBeFocused();
});
