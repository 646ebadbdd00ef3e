// npm test: everything that can be tested, closing on one line that adds all runs up.
import { mkdtempSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './run-command.mjs';
import { ROOT, setUp } from './setup.mjs';
import { addUp, countEndToEnd, countVitest } from './test-counts.mjs';
import { runScript } from './trouble.mjs';

const BIN = join(ROOT, 'node_modules', '.bin');

/**
 * @param {string} reports the folder for its report
 * @param {string} projects which of vitest.config.ts
 */
async function runVitest(reports, projects) {
  const report = join(reports, `${projects}.json`);
  const { status } = await runCommand(
    join(BIN, 'vitest'),
    ['run', '--project', projects, '--reporter=default', '--reporter=json', `--outputFile.json=${report}`],
    { cwd: ROOT, show: true },
  );
  return { status, counts: countVitest(report) };
}

/** @param {string} reports the folder for its report */
async function runEndToEnd(reports) {
  const report = join(reports, 'end-to-end.json');
  const { status } = await runCommand(
    join(BIN, 'playwright'),
    ['test', '--reporter=list,json', '--pass-with-no-tests'],
    { cwd: ROOT, show: true, env: { PLAYWRIGHT_JSON_OUTPUT_FILE: report } },
  );
  return { status, counts: countEndToEnd(report) };
}

await runScript(async () => {
  await setUp({ debian: ['postgresql-15', 'ffmpeg', 'libheif-examples', 'chromium'], build: 'when-changed' });
  const reports = mkdtempSync(join(ROOT, '.astro', 'test-reports-'));
  try {
    const { line, status } = addUp([
      // Apart from the rest, because the projects differ in how many workers they may have.
      await runVitest(reports, '!integration'),
      await runVitest(reports, 'integration'),
      await runEndToEnd(reports),
    ]);
    console.log(`\n${line}`);
    return status;
  } finally {
    rmSync(reports, { recursive: true, force: true });
  }
});
