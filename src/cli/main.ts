import { readFileSync } from 'node:fs';
import { createInterface } from 'node:readline';
import { type Answer, right, wrong } from '../domain/answer.ts';
import { decodeText } from '../domain/captions/decode-text.ts';
import { answerLine, prepareLine } from './answer-line.ts';
import { prepareCommand, runCommand } from './run-command.ts';

/** The exit status for input that is wrong; 1 stays for a fault of the program. */
const BAD_INPUT = 2;

function readText(path: string): Answer<string> {
  try {
    return right(decodeText(readFileSync(path)).text);
  } catch {
    return wrong(`The file ${path} cannot be read.`);
  }
}

async function answerBatch(): Promise<void> {
  for await (const line of createInterface({ input: process.stdin, crlfDelay: Number.POSITIVE_INFINITY }))
    if (line.trim() !== '') process.stdout.write(`${JSON.stringify(await answerOrFault(line))}\n`);
}

/** A fault of the program in one line leaves the others answered, and is seen in the exit status. */
async function answerOrFault(line: string): Promise<Answer<unknown>> {
  try {
    await prepareLine(line);
    return answerLine(line);
  } catch (error) {
    process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
    process.exitCode = 1;
    return wrong('This could not be computed; the fault is the program’s.');
  }
}

// A reader that has seen enough, such as head, closes the pipe: that is no fault.
process.stdout.on('error', (error: NodeJS.ErrnoException) => {
  if (error.code !== 'EPIPE') throw error;
  process.exit(0);
});

const args = process.argv.slice(2);
if (args[0] === 'batch' && args.length === 1) {
  await answerBatch();
} else {
  await prepareCommand(args);
  const answer = runCommand(args, readText);
  if (answer.ok) process.stdout.write(answer.value);
  else {
    process.stderr.write(`${answer.error}\n`);
    process.exitCode = BAD_INPUT;
  }
}
