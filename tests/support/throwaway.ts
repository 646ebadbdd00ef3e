import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** A new empty folder for one test or one run, and how to remove it. */
export function throwawayFolder(purpose: string): { path: string; remove: () => void } {
  const path = mkdtempSync(join(tmpdir(), `centrepop-${purpose}-`));
  return {
    path,
    remove: () => {
      rmSync(path, { recursive: true, force: true, maxRetries: 5 });
    },
  };
}
