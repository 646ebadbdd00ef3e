// npm test: everything that can be tested, closing on one line that adds both runners up.
import { mkdtempSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { runCommand } from './run-command.mjs';
import { ROOT, setUp } from './setup.mjs';
import { addUp, countEndToEnd, countVitest } from './test-counts.mjs';
import { runScript } from './trouble.mjs';

const BIN = join(ROOT, 'node_modules', '.bin');

await runScript(async () => {
  await setUp({ debian: ['postgresql-15', 'ffmpeg', 'chromium'], build: 'when-changed' });
  const reports = mkdtempSync(join(ROOT, '.astro', 'test-reports-'));
  const vitestReport = join(reports, 'vitest.json');
  const endToEndReport = join(reports, 'end-to-end.json');
  try {
    const vitest = await runCommand(
      join(BIN, 'vitest'),
      ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${vitestReport}`],
      { cwd: ROOT, show: true },
    );
    const endToEnd = await runCommand(
      join(BIN, 'playwright'),
      ['test', '--reporter=list,json', '--pass-with-no-tests'],
      {
        cwd: ROOT,
        show: true,
        env: { PLAYWRIGHT_JSON_OUTPUT_FILE: endToEndReport },
      },
    );
    const { line, status } = addUp([
      { status: vitest.status, counts: countVitest(vitestReport) },
      { status: endToEnd.status, counts: countEndToEnd(endToEndReport) },
    ]);
    console.log(`\n${line}`);
    return status;
  } finally {
    rmSync(reports, { recursive: true, force: true });
  }
});
