import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { readFile } from 'node:fs/promises';
import { PDF_REFUSALS } from './pdf-refusals.ts';
import { RefusedFile } from './refused-file.ts';
import { runProgram } from './run-program.ts';

const MOST_BYTES = 200 * 2 ** 20;

/**
 * Writes a PDF anew, in a process of its own: without metadata, programs, attached files, and what cameras wrote
 * into its pictures.
 * @param path the PDF
 * @throws RefusedFile when it is damaged, locked or too large
 */
export async function rewritePdf(path: string): Promise<Buffer> {
  const bytes = await readFile(path);
  if (bytes.length > MOST_BYTES)
    throw new RefusedFile('The PDF is larger than 200 MiB. Export it with smaller pictures and send that.');
  if (!bytes.subarray(-2048).includes('%%EOF')) throw new RefusedFile(PDF_REFUSALS[2]);
  const { status, timedOut, stdout } = await runProgram({
    program: process.execPath,
    // No cap on address space: the engine reserves far more than it uses; its heap is capped instead.
    args: ['--max-old-space-size=1024', ...childProgram()],
    seconds: 120,
    stdin: bytes,
  });
  if (timedOut) throw new RefusedFile(PDF_REFUSALS[2]);
  if (status !== 0) throw new RefusedFile(status === 3 ? PDF_REFUSALS[3] : PDF_REFUSALS[2]);
  return stdout;
}

/** Beside this bundle in the build; from the sources as it stands. */
function childProgram(): string[] {
  const here = import.meta.url;
  if (!here.endsWith('.ts')) return [fileURLToPath(new URL('./rewrite-pdf-child.mjs', here))];
  const loader = createRequire(here).resolve('tsx');
  return ['--import', loader, fileURLToPath(new URL('./rewrite-pdf-child.ts', here))];
}
