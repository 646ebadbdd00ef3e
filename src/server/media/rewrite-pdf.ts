import { readFile } from 'node:fs/promises';
import { PDF_REFUSALS } from './pdf-refusals.ts';
import { RefusedFile } from './refused-file.ts';
import { runNode } from '../run-node.ts';

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
  const { status, timedOut, stdout } = await runNode({
    source: new URL('./rewrite-pdf-child.ts', import.meta.url),
    heapMebibytes: 1024,
    seconds: 120,
    stdin: bytes,
  });
  if (timedOut) throw new RefusedFile(PDF_REFUSALS[2]);
  if (status !== 0) throw new RefusedFile(status === 3 ? PDF_REFUSALS[3] : PDF_REFUSALS[2]);
  return stdout;
}
