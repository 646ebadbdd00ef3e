import { existsSync, readFileSync } from 'node:fs';
import { Trouble } from './trouble.mjs';

/** Whether the log says that the port was taken in the meantime. */
export function saysPortTaken(log: string): boolean {
  return /could not bind|Address already in use/.test(log);
}

/** Whether the log says that processes of a killed predecessor still hold its memory. */
export function saysPredecessorLingers(log: string): boolean {
  return /pre-existing shared memory block/.test(log);
}

/**
 * What a failed start of PostgreSQL means, in one sentence.
 * @param log what it wrote
 * @param logFile where that can be read
 */
export function explainLog(log: string, logFile: string, folder: string): Trouble {
  if (/No space left on device/.test(log)) {
    return new Trouble(`The disk is full: free some space for ${folder}, then start again.`);
  }
  if (/incompatible with server|was initialized by PostgreSQL version/.test(log)) {
    return new Trouble(
      `The database in ${folder} was made by another version of PostgreSQL. Centrepop uses 15: use another DATA_DIR, or move the data with pg_dump.`,
    );
  }
  if (/could not map anonymous shared memory|out of memory|Cannot allocate memory/i.test(log)) {
    return new Trouble('There is not enough memory for PostgreSQL: free some, then start again.');
  }
  return new Trouble(
    `PostgreSQL did not start on ${folder}; ${logFile} says why. Put the folder back from a backup, or use another DATA_DIR.`,
  );
}

/** The end of a log file, empty when there is none. */
export function readLog(file: string): string {
  return existsSync(file) ? readFileSync(file, 'utf8').slice(-20_000) : '';
}
