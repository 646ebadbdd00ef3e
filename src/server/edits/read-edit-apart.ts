import { type Answer, right, wrong } from '../../domain/answer.ts';
import { type Edit, type ReadEditOptions } from '../../domain/edit/edit.ts';
import { type EditRecord, fromEditRecord } from '../../domain/edit/edit-record.ts';
import { readEdit } from '../../domain/edit/read-edit.ts';
import { runNode } from '../run-node.ts';
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
  const { status, stdout } = await runNode({
    source: new URL('./read-edit-child.ts', import.meta.url),
    heapMebibytes: 1024,
    seconds: SECONDS_AT_MOST,
    stdin: Buffer.from(JSON.stringify(request)),
  });
  if (status !== 0) return wrong('The edit is too much to read at once. Nothing was taken.');
  const answer = JSON.parse(stdout.toString()) as Answer<EditRecord>;
  return answer.ok ? right(fromEditRecord(answer.value)) : answer;
}
