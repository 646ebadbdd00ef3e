import { type Answer, wrong } from '../domain/answer.ts';
import { type Request } from './tool.ts';
import { findTool } from './tools/find-tool.ts';

/** The answer to one line of a batch. A line that cannot be answered says why, and the next one is asked all the same. */
export function answerLine(line: string): Answer<unknown> {
  const request = parseLine(line);
  if (request === null) return wrong('This line is no JSON object.');
  const tool = findTool(request['tool']);
  if (!tool.ok) return tool;
  try {
    return tool.value.run(request);
  } catch (error) {
    // A number that no reader thought to refuse.
    if (error instanceof RangeError) return wrong(error.message);
    throw error;
  }
}

/** Loads what the tool of a line needs, once; a line that names none needs nothing. */
export async function prepareLine(line: string): Promise<void> {
  const tool = findTool(parseLine(line)?.['tool']);
  if (tool.ok) await tool.value.prepare?.();
}

function parseLine(line: string): Request | null {
  try {
    const parsed: unknown = JSON.parse(line);
    return typeof parsed === 'object' && parsed !== null && !Array.isArray(parsed)
      ? (parsed as Request)
      : null;
  } catch {
    return null;
  }
}
