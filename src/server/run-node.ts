import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { type ProgramResult, runProgram } from './run-program.ts';

interface NodeCall {
  /** The child's source file; its bundle stands in dist/ under the same name. */
  readonly source: URL;
  readonly heapMebibytes: number;
  readonly seconds: number;
  readonly stdin: Uint8Array;
}

/** Runs a program of ours in a process of its own: from the sources, or its bundle where this is built. */
export function runNode({ source, heapMebibytes, seconds, stdin }: NodeCall): Promise<ProgramResult> {
  return runProgram({
    program: process.execPath,
    // No cap on address space: the engine reserves far more than it uses; its heap is capped instead.
    args: [`--max-old-space-size=${String(heapMebibytes)}`, ...programOf(source)],
    seconds,
    stdin,
  });
}

function programOf({ href }: URL): string[] {
  const [, built, name] = /^(.*\/dist\/).*?([^/]+)\.ts$/.exec(href) ?? [];
  if (built !== undefined && name !== undefined) return [fileURLToPath(`${built}${name}.mjs`)];
  const loader = createRequire(import.meta.url).resolve('tsx');
  return ['--import', loader, fileURLToPath(href)];
}
