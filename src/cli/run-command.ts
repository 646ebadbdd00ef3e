import { type Answer, right } from '../domain/answer.ts';
import { type ReadFile } from './tool.ts';
import { findTool } from './tools/find-tool.ts';

/** What a command prints on standard output, line end included, or the sentence of what is wrong with it. */
export function runCommand([name, ...args]: readonly string[], read: ReadFile): Answer<string> {
  const tool = findTool(name);
  if (!tool.ok) return tool;
  const request = tool.value.fromArguments(args, read);
  if (!request.ok) return request;
  const answer = tool.value.run(request.value);
  if (!answer.ok) return answer;
  const { print = (value: unknown) => `${JSON.stringify(value)}\n` } = tool.value;
  return right(print(answer.value));
}

/** Loads what a command needs before it runs. */
export async function prepareCommand([name]: readonly string[]): Promise<void> {
  const tool = findTool(name);
  if (tool.ok) await tool.value.prepare?.();
}
