import { codeOf, enterPassword } from '../support/e2e/steps.ts';
import { PASSWORD } from '../support/people.ts';
import { expect, linkIn, test } from '../support/e2e/test.ts';

test('a viewer signs in by a mailed link, once', async ({ page, product, outbox, openBrowser }) => {
  const { email } = await product.person('Ines Vale');
  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Sign in by a mailed link' }).click();
  await page.getByLabel('E-mail address').fill(email);
  await page.getByRole('button', { name: 'Mail me a link' }).click();
  await expect(page.getByRole('status')).toContainText('a link is on its way');
  const link = linkIn(await outbox.messageTo(email), '/sign-in/open');
  await page.goto(link);
  await page.getByRole('button', { name: 'Sign in here' }).click();
  await expect(page.getByText(email)).toBeVisible();

  const later = await (await openBrowser()).newPage();
  await later.goto(link);
  await later.getByRole('button', { name: 'Sign in here' }).click();
  await expect(later.getByRole('alert')).toContainText('This link no longer works');
});

test('a forgotten password is replaced, and every session ends', async ({
  page,
  product,
  outbox,
  openBrowser,
}) => {
  const person = await product.person('Lorn Abbott');
  const elsewhere = await (await openBrowser(person)).newPage();
  await elsewhere.goto('/account');
  await expect(elsewhere.getByRole('heading', { name: person.name })).toBeVisible();

  await page.goto('/sign-in');
  await page.getByRole('link', { name: 'Forgotten the password?' }).click();
  await page.getByLabel('E-mail address').fill(person.email);
  await page.getByRole('button', { name: 'Mail me a link' }).click();
  await page.goto(linkIn(await outbox.messageTo(person.email), '/reset/password'));
  await page.getByLabel('New password').fill('another-long-one');
  await page.getByRole('button', { name: 'Set the password' }).click();
  await enterPassword(page, person.email, 'another-long-one');
  await expect(page.getByText(person.email)).toBeVisible();
  await elsewhere.reload();
  await expect(elsewhere.getByRole('heading', { name: 'Sign in' })).toBeVisible();
});

test('signing in leads back to the page that asked for it', async ({ page, product }) => {
  const owner = await product.owner('Hale Orchard', 'Back Yard');
  const team = `/bench/${owner.workshop}/team`;
  await page.goto(team);
  await enterPassword(page, owner.email);
  await page.getByLabel('Code', { exact: true }).fill(codeOf(owner.key));
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page).toHaveURL(team);
  await expect(page.getByRole('heading', { name: 'Team' })).toBeVisible();
});

test('signing in never leads to another site', async ({ page, product }) => {
  const { email } = await product.person('Enno Stiles');
  await page.goto('/sign-in?next=//elsewhere.example/bench');
  await enterPassword(page, email);
  await expect(page).toHaveURL('/bench');
});

test('a recovery code stands in for a lost phone, once', async ({ page, signIn, product }) => {
  const owner = await product.owner('Vesna Kray', 'Salt Loft');
  await signIn(owner);
  await page.goto('/account/second-factor');
  await page.getByLabel('Your password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Make new codes' }).click();
  await expect(page.getByRole('heading', { name: 'Your new recovery codes' })).toBeVisible();
  const [code = ''] = await page.getByRole('main').getByRole('listitem').allInnerTexts();

  const useCode = async () => {
    await page.context().clearCookies();
    await page.goto('/sign-in');
    await enterPassword(page, owner.email);
    await page.getByText('Use a recovery code').click();
    await page.getByLabel('Recovery code').fill(code);
    await page.getByRole('button', { name: 'Sign in with it' }).click();
  };
  await useCode();
  await expect(page.getByRole('heading', { name: 'Today' })).toBeVisible();
  await useCode();
  await expect(page.getByRole('alert')).toContainText('That recovery code is not right');
});
