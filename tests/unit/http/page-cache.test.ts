import { expect, test } from 'vitest';
import { PageCache } from '../../../src/server/http/page-cache.ts';
import { type KeptPage, makePageForm } from '../../../src/server/http/page-forms.ts';

async function page(bytes: number): Promise<KeptPage> {
  const answer = { status: 200, headers: [], body: Buffer.alloc(bytes, 'a'), tags: ['build:1'] };
  const form = await makePageForm(answer, 'identity', []);
  return {
    identity: form,
    gzip: await makePageForm(answer, 'gzip', []),
    br: await makePageForm(answer, 'br', []),
  };
}

test('a change drops the pages with its tag and no others', async () => {
  const cache = new PageCache();
  const kept = await page(10);
  cache.keep('/a', kept, ['build:1', 'workshop:1']);
  cache.keep('/b', kept, ['build:2', 'workshop:1']);
  cache.drop(['build:1']);
  expect(cache.get('/a')).toBeUndefined();
  expect(cache.get('/b')).toBe(kept);
  cache.drop(['workshop:1']);
  expect(cache.size()).toEqual({ pages: 0, bytes: 0, tags: 0 });
});

test('memory stays within its limit; the page asked for least lately goes first', async () => {
  const cache = new PageCache(30_000);
  const kept = await page(8_000);
  for (const path of ['/a', '/b']) cache.keep(path, kept, ['build:1']);
  cache.get('/a');
  for (const path of ['/c', '/d']) {
    cache.keep(path, kept, ['build:1']);
    cache.get('/a');
  }
  expect(cache.get('/a')).toBe(kept);
  expect(cache.get('/b')).toBeUndefined();
  expect(cache.size().bytes).toBeLessThanOrEqual(30_000);
});

test('a page larger than the cache is not taken in, nor are its tags', async () => {
  const cache = new PageCache(5_000);
  cache.keep('/a', await page(8_000), ['build:1']);
  expect(cache.size()).toEqual({ pages: 0, bytes: 0, tags: 0 });
});

test('a page ends after its time', async () => {
  const cache = new PageCache(100_000, 30);
  cache.keep('/a', await page(10), ['build:1']);
  expect(cache.get('/a')).toBeDefined();
  await expect.poll(() => cache.get('/a')).toBeUndefined();
});
