import { type Page } from '@playwright/test';
import { expect, test } from '../support/e2e/test.ts';

function watchMe(page: Page): string[] {
  const asked: string[] = [];
  page.on('request', (request) => {
    if (new URL(request.url()).pathname === '/api/me') asked.push(request.url());
  });
  return asked;
}

test('the public bar asks nothing about a reader who is not signed in @narrow', async ({ page }) => {
  const asked = watchMe(page);
  await page.goto('/', { waitUntil: 'networkidle' });
  await expect(page.getByRole('banner').getByRole('link', { name: 'Sign in' })).toHaveAttribute(
    'href',
    '/sign-in',
  );
  expect(asked).toEqual([]);
});

test('the public bar leads someone signed in to their bench @narrow', async ({ page, signIn, product }) => {
  const owner = await product.owner('Jory Bain', 'North Slip');
  await signIn(owner);
  const asked = watchMe(page);
  await page.goto(`/w/${owner.workshop}`);
  const link = page.getByRole('banner').getByRole('link', { name: 'North Slip' }).last();
  await expect(link).toHaveAttribute('href', '/bench');
  expect(asked).toHaveLength(1);
  await link.click();
  await expect(page).toHaveURL(`/bench/${owner.workshop}`);
});

test('someone without a role finds their name in the public bar', async ({ page, signIn, product }) => {
  const person = await product.person('Petra Holm');
  await signIn(person);
  await page.goto('/');
  await expect(page.getByRole('banner').getByRole('link', { name: person.name })).toBeVisible();
});
