// npm run check: everything that can be known without running the product.
import { ROOT, setUp } from './setup.mjs';
import { runCommand } from './run-command.mjs';
import { runScript } from './trouble.mjs';

/** Astro first: it writes the types that the others read. */
const STEPS = /** @type {const} */ ([
  ['pages', 'astro', ['check', '--minimumSeverity', 'hint']],
  ['types', 'tsc', ['--noEmit', '-p', '.']],
  ['lint', 'eslint', ['.']],
  ['format', 'prettier', ['--check', '.']],
  ['architecture', 'vitest', ['run', '--project', 'unit', 'tests/architecture.test.ts', '--passWithNoTests']],
  ['unused', 'knip', []],
]);

await runScript(async () => {
  await setUp({});
  /** @type {string[]} */
  const failed = [];
  for (const [name, program, args] of STEPS) {
    const start = Date.now();
    console.log(`\n${name}: ${program} ${args.join(' ')}`);
    const { status } = await runCommand(`${ROOT}/node_modules/.bin/${program}`, args, {
      cwd: ROOT,
      show: true,
    });
    const seconds = ((Date.now() - start) / 1000).toFixed(1);
    console.log(`${name} ${status === 0 ? 'is fine' : 'has failed'} (${seconds} s)`);
    if (status !== 0) failed.push(name);
  }
  console.log(failed.length === 0 ? '\nEverything is fine.' : `\nFailed: ${failed.join(', ')}.`);
  return failed.length === 0 ? 0 : 1;
});
