import { type Page } from '@playwright/test';
import { TOTP } from 'otpauth';
import { PASSWORD } from '../people.ts';

/**
 * The six digits that an authenticator app would show now; the key may stand in groups, as the page shows it.
 * @param steps how many codes on: each is taken once, and the next one already a little before its time
 */
export function codeOf(key: string | null, steps = 0): string {
  const timestamp = Date.now() + steps * 30_000;
  return new TOTP({ secret: (key ?? '').replace(/\s/g, '') }).generate({ timestamp });
}

/** Fills the sign-in form that is open and sends it. */
export async function enterPassword(page: Page, email: string, password = PASSWORD): Promise<void> {
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(password);
  await page.getByRole('button', { name: 'Sign in' }).click();
}

/** Fills the sign-up form that is open and sends it. */
export async function enterSignUp(page: Page, name: string, email: string): Promise<void> {
  await page.getByLabel('Your name').fill(name);
  await page.getByLabel('E-mail address').fill(email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign up' }).click();
}

/** Confirms an address on the page that the mailed link has opened. */
export async function confirmWithPassword(page: Page, link: string): Promise<void> {
  await page.goto(link);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Confirm and sign in' }).click();
}
