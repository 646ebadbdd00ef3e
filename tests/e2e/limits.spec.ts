import { newAddress } from '../support/e2e/product.ts';
import { enterPassword } from '../support/e2e/steps.ts';
import { expect, test } from '../support/e2e/test.ts';

test('after ten tries for one address the sign-in page says how long to wait', async ({ page, baseURL }) => {
  const email = newAddress('guessed');
  for (let tries = 1; tries <= 10; tries += 1) {
    const answer = await page.request.post('/api/account/sign-in', {
      form: { email, password: `guess-number-${String(tries)}` },
      headers: { origin: baseURL ?? '' },
    });
    expect(answer.status()).toBe(422);
  }
  await page.goto('/sign-in');
  await enterPassword(page, email, 'one-guess-more');
  await expect(page.getByRole('alert')).toContainText(/Too many tries\. Wait \d+ (minutes|seconds)/);
  await expect(page.getByLabel('E-mail address')).toHaveValue(email);
});
