import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import { type Edit, type ReadEditOptions } from '../../domain/edit/edit.ts';
import { type EditRecord, fromEditRecord } from '../../domain/edit/edit-record.ts';
import { readEdit } from '../../domain/edit/read-edit.ts';
import { runProgram } from '../media/run-program.ts';
import { type EditRequest } from './edit-request.ts';

/** Texts up to this length are read at once: some hundred events, a few milliseconds. Our own choice. */
const SHORT = 64 * 1024;

/** What a list of 5 MiB takes on a slow and busy machine, several times over. */
const SECONDS_AT_MOST = 90;

/**
 * Reads an edit without holding up other requests: a long text in a process of its own.
 * @returns as `readEdit`; a sentence, too, when the text is too much for that process
 */
export async function readEditApart(
  text: string,
  { rate, clipRates = new Map() }: ReadEditOptions,
): Promise<Answer<Edit>> {
  if (text.length <= SHORT) return readEdit(text, { rate, clipRates });
  const request: EditRequest = { text, rate, clipRates: [...clipRates] };
  const { status, stdout } = await runProgram({
    program: process.execPath,
    args: ['--max-old-space-size=1024', ...childProgram()],
    seconds: SECONDS_AT_MOST,
    stdin: Buffer.from(JSON.stringify(request)),
  });
  if (status !== 0) return wrong('The edit is too much to read at once. Nothing was taken.');
  const answer = JSON.parse(stdout.toString()) as Answer<EditRecord>;
  return answer.ok ? right(fromEditRecord(answer.value)) : answer;
}

/** In the build's folder; from the sources as it stands. */
function childProgram(): string[] {
  const here = import.meta.url;
  if (!here.endsWith('.ts')) return [fileURLToPath(here.replace(/\/dist\/.*$/, '/dist/read-edit-child.mjs'))];
  const loader = createRequire(here).resolve('tsx');
  return ['--import', loader, fileURLToPath(new URL('./read-edit-child.ts', here))];
}
