import { execFileSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { join, relative } from 'node:path';
import { ROOT } from '../started-product.ts';
import { readSource } from './import-graph.ts';

/** The journal times of the migrations, in their order. */
export function journalTimes(): number[] {
  const journal = JSON.parse(readSource('drizzle/meta/_journal.json')) as { entries: { when: number }[] };
  return journal.entries.map(({ when }) => when);
}

/** What drizzle-kit would say to the schema as it is now, asked on a copy of the migrations. */
export function generateOnCopy(): string {
  // A fresh clone has none before its first build.
  mkdirSync(join(ROOT, '.astro'), { recursive: true });
  const copy = mkdtempSync(join(ROOT, '.astro', 'migrations-'));
  try {
    cpSync(join(ROOT, 'drizzle'), copy, { recursive: true });
    const program = join(ROOT, 'node_modules/.bin/drizzle-kit');
    const args = ['--dialect=postgresql', '--schema=./src/db/schema/*.ts', `--out=${relative(ROOT, copy)}`];
    return execFileSync(program, ['generate', ...args], { cwd: ROOT, encoding: 'utf8', stdio: 'pipe' });
  } finally {
    rmSync(copy, { recursive: true, force: true });
  }
}
