import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { packagesMatch } from '../../../scripts/ensure-packages.mjs';
import { throwawayFolder } from '../../support/throwaway.ts';

const LOCKED = {
  '': { name: 'centrepop' },
  'node_modules/gauge': { version: '1.0.0', integrity: 'sha512-a' },
  'node_modules/gauge-other-machine': { version: '1.0.0', integrity: 'sha512-b', optional: true },
};

let folder: ReturnType<typeof throwawayFolder>;
beforeEach(() => {
  folder = throwawayFolder('packages');
  mkdirSync(join(folder.path, 'node_modules/gauge'), { recursive: true });
  writeLock('package-lock.json', LOCKED);
});
afterEach(() => {
  folder.remove();
});

function writeLock(file: string, packages: unknown): void {
  writeFileSync(join(folder.path, file), JSON.stringify({ packages }));
}

function installed(packages: unknown): boolean {
  writeLock('node_modules/.package-lock.json', packages);
  return packagesMatch(folder.path);
}

test('packages as locked match, without those for other machines', () => {
  expect(installed({ 'node_modules/gauge': LOCKED['node_modules/gauge'] })).toBe(true);
});

test('an interrupted install, which has no list yet, does not match', () => {
  expect(packagesMatch(folder.path)).toBe(false);
});

test.each([
  ['an older version', { 'node_modules/gauge': { version: '0.9.0', integrity: 'sha512-a' } }],
  ['other content', { 'node_modules/gauge': { version: '1.0.0', integrity: 'sha512-c' } }],
  ['a missing package', {}],
  [
    'a package that the lock does not know',
    {
      'node_modules/gauge': LOCKED['node_modules/gauge'],
      'node_modules/stray': { version: '1.0.0' },
    },
  ],
])('%s does not match', (_what, packages) => {
  expect(installed(packages)).toBe(false);
});
