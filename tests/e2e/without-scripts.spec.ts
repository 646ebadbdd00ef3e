import { newAddress } from '../support/e2e/product.ts';
import { enterPassword, enterSignUp } from '../support/e2e/steps.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';

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
