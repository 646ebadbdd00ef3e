import { type DestinationStream } from 'pino';

const MOST_CHARACTERS = 32 * 1024;
const LONGEST_MS = 200;

/**
 * A destination for pino that passes lines on many at a time: one line a request, each written alone, costs more
 * than answering from memory. Lines are late by at most 200 ms; those still held are written when the process ends,
 * and only a kill loses them.
 * @param target where they go in the end, such as `pino.destination(1)`
 */
export function bufferLines(target: DestinationStream): DestinationStream {
  let held = '';
  let timer: NodeJS.Timeout | undefined;

  function flush(): void {
    clearTimeout(timer);
    timer = undefined;
    if (held === '') return;
    const lines = held;
    held = '';
    target.write(lines);
  }

  process.once('exit', flush);
  return {
    write(line) {
      held += line;
      if (held.length >= MOST_CHARACTERS) flush();
      else timer ??= setTimeout(flush, LONGEST_MS).unref();
    },
  };
}
