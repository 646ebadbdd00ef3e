import { readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';

/** How many files a folder holds. */
export function filesIn(folder: string): number {
  return readdirSync(folder).length;
}

/** How many files of a folder hold at least a byte. */
export function filledFilesIn(folder: string): number {
  return readdirSync(folder).filter((name) => statSync(join(folder, name)).size > 0).length;
}

/** Resolves as soon as a condition holds. Rejects after ten seconds. */
export async function waitFor(condition: () => boolean): Promise<void> {
  const end = Date.now() + 10_000;
  while (!condition()) {
    if (Date.now() > end) throw new Error('The condition did not come to hold within ten seconds.');
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
}
