import { type BrowserContext, expect, test as base } from '@playwright/test';
import { outboxAt } from '../outbox.ts';
import { type TestPerson } from '../people.ts';
import { listenForComplaints } from './complaints.ts';
import { openProduct, type Product } from './product.ts';

export { expect };

interface Fixtures {
  /** The mail that the copy has sent. */
  outbox: ReturnType<typeof outboxAt>;
  /** Another browser, with cookies of its own; it may start signed in. */
  openBrowser: (as?: TestPerson) => Promise<BrowserContext>;
  /** Gives the spec's first browser someone's session, without the pages for it. */
  signIn: (person: TestPerson) => Promise<void>;
  /** Everything the browsers complained about; a spec fails on any of it. */
  complaints: string[];
}

/** Playwright's `test` with the shared copy behind it. */
export const test = base.extend<Fixtures, { product: Product }>({
  product: [
    async ({ browserName: _browserName }, use) => {
      const product = await openProduct();
      await use(product);
      await product.services.close();
    },
    { scope: 'worker' },
  ],
  outbox: async ({ browserName: _browserName }, use) => {
    await use(outboxAt(process.env['OUTBOX_URL'] ?? ''));
  },
  complaints: [
    async ({ context }, use) => {
      const complaints: string[] = [];
      listenForComplaints(context, complaints);
      await use(complaints);
      expect(complaints, 'the browser complained').toEqual([]);
    },
    { auto: true },
  ],
  signIn: async ({ context, product }, use) => {
    await use((person) => giveCookies(context, product.cookiesOf(person)));
  },
  openBrowser: async ({ browser, complaints, product }, use) => {
    const opened: BrowserContext[] = [];
    await use(async (as) => {
      const context = await browser.newContext();
      opened.push(context);
      listenForComplaints(context, complaints);
      if (as) await giveCookies(context, product.cookiesOf(as));
      return context;
    });
    for (const context of opened) await context.close();
  },
});

async function giveCookies(context: BrowserContext, cookies: readonly string[]): Promise<void> {
  const url = process.env['PUBLIC_URL'] ?? '';
  await context.addCookies(
    cookies.map((cookie) => {
      const [name = '', value = ''] = cookie.split(/=(.*)/s);
      return { name, value, url };
    }),
  );
}

/** The path that a mail's one link of ours leads to. */
export function linkIn({ links }: { readonly links: readonly string[] }, start: string): string {
  const found = links.map((link) => new URL(link)).find(({ pathname }) => pathname.startsWith(start));
  if (!found) throw new Error(`No link to ${start} in this mail; there are: ${links.join(' ')}`);
  return found.pathname + found.search;
}
