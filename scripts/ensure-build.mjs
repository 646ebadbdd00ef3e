import { createHash } from 'node:crypto';
import { existsSync, readFileSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './run-command.mjs';
import { Trouble } from './trouble.mjs';

/** Everything that decides what the build gives. */
const SOURCES = [
  'src',
  'public',
  'astro.config.mjs',
  'package.json',
  'package-lock.json',
  'tsconfig.json',
  'scripts/ensure-build.mjs',
];

const STAMP = 'dist/built-from';

/** The processes that run without Astro around them. */
const BUNDLES = [
  { from: 'src/web.ts', to: 'dist/web.mjs' },
  { from: 'src/worker.ts', to: 'dist/worker.mjs' },
  // PDFs are rewritten, long edit lists read, and cutting plans made in processes of their own.
  { from: 'src/server/media/rewrite-pdf-child.ts', to: 'dist/rewrite-pdf-child.mjs' },
  { from: 'src/server/edits/read-edit-child.ts', to: 'dist/read-edit-child.mjs' },
  { from: 'src/server/solver/plan-cuts-child.ts', to: 'dist/plan-cuts-child.mjs' },
];

/**
 * @param {string} root
 * @returns {string} a name for the state of the sources
 */
function hashSources(root) {
  const hash = createHash('sha256').update(process.version);
  for (const source of SOURCES) {
    const path = join(root, source);
    if (!existsSync(path)) continue;
    /** @type {string[]} */
    let files = [''];
    try {
      files = readdirSync(path, { recursive: true, withFileTypes: true })
        .filter((entry) => entry.isFile())
        .map((entry) => join(entry.parentPath, entry.name).slice(path.length))
        .sort();
    } catch {
      // Not a folder.
    }
    for (const file of files) hash.update(`\0${source}${file}\0`).update(readFileSync(path + file));
  }
  return hash.digest('hex');
}

/**
 * @param {string} root
 * @returns {string}
 */
function readStamp(root) {
  try {
    return readFileSync(join(root, STAMP), 'utf8');
  } catch {
    return '';
  }
}

/** @param {string} root */
async function buildAstro(root) {
  const astro = join(root, 'node_modules', 'astro', 'astro.js');
  const { status, output } = await runCommand(process.execPath, [astro, 'build'], {
    cwd: root,
    env: { NODE_ENV: 'production' },
  });
  if (status === 0) return;
  console.error(output.trimEnd());
  if (/ENOSPC|No space left/.test(output)) {
    throw new Trouble('The disk is full: free some space, then start again.');
  }
  throw new Trouble('The pages could not be built; what the build said is above.');
}

/** @param {string} root */
async function bundleProcesses(root) {
  const { build } = await import('esbuild');
  await build({
    absWorkingDir: root,
    entryPoints: BUNDLES.filter(({ from }) => existsSync(join(root, from))).map(({ from, to }) => ({
      in: from,
      out: to.replace(/\.mjs$/, ''),
    })),
    outdir: '.',
    outExtension: { '.js': '.mjs' },
    bundle: true,
    platform: 'node',
    target: 'node20',
    format: 'esm',
    packages: 'external',
    // Astro's handler is beside the bundle and loaded when the process runs.
    external: ['./server/entry.mjs'],
    sourcemap: true,
    jsx: 'automatic',
    logLevel: 'warning',
  });
}

/**
 * Builds the pages and the processes into dist/ when their sources have changed.
 * @param {string} root the checkout
 * @param {{ force?: boolean }} [options]
 */
export async function ensureBuild(root, { force = false } = {}) {
  const wanted = hashSources(root);
  if (!force && readStamp(root) === wanted) return;
  console.log('Building …');
  rmSync(join(root, STAMP), { force: true });
  await buildAstro(root);
  try {
    await bundleProcesses(root);
  } catch (error) {
    throw new Trouble(
      `The processes could not be bundled: ${error instanceof Error ? error.message : String(error)}`,
    );
  }
  writeFileSync(join(root, STAMP), wanted);
}
