import { readdirSync, readFileSync } from 'node:fs';

/** The processes that a process has started, by their command lines. */
export function childrenOf(parent: number | undefined): { pid: number; command: string }[] {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .flatMap((name) => {
      try {
        const [, ppid] = /\) \S (\d+)/.exec(readFileSync(`/proc/${name}/stat`, 'utf8')) ?? [];
        if (Number(ppid) !== parent) return [];
        return [
          { pid: Number(name), command: readFileSync(`/proc/${name}/cmdline`, 'utf8').replaceAll('\0', ' ') },
        ];
      } catch {
        // It has ended meanwhile.
        return [];
      }
    });
}

/** The parts of a started copy, and what the command line of each has in it. */
export const PROGRAMS = {
  web: 'dist/web.mjs',
  worker: 'dist/worker.mjs',
  storage: 'fake-s3/main.ts',
  mail: 'fake-smtp/main.ts',
  PostgreSQL: 'bin/postgres',
} as const;
