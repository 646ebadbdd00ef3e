import { readFileSync } from 'node:fs';
import { findFreePort } from '../../scripts/ports.ts';
import { paths } from '../../src/paths.ts';
import { childrenOf } from '../support/child-processes.ts';
import { startProduct } from '../support/started-product.ts';
import { throwawayFolder } from '../support/throwaway.ts';
import { type Bench, formatTable } from './support/bench.ts';

const ROUNDS = 200;
const PARTS = [
  ['web', 'dist/web.mjs'],
  ['worker', 'dist/worker.mjs'],
  ['storage stand-in', 'fake-s3/main.ts'],
  ['mail stand-in', 'fake-smtp/main.ts'],
  ['PostgreSQL', 'bin/postgres'],
] as const;

/** In MiB; `most` is the most that it has ever had. */
function memoryOf(pid: number): { now: number; most: number } {
  const status = readFileSync(`/proc/${String(pid)}/status`, 'utf8');
  const mebibytes = (name: string) =>
    Math.round(Number(new RegExp(`${name}:\\s+(\\d+) kB`).exec(status)?.[1]) / 1024);
  return { now: mebibytes('VmRSS'), most: mebibytes('VmHWM') };
}

/** Asks for what viewers and their feed readers ask for, again and again. */
async function read(origin: string): Promise<void> {
  const home = await (await fetch(origin)).text();
  const pages = [...home.matchAll(/href="(\/w\/[^"]+)"/g)].map(([, path]) => path ?? '');
  for (let round = 0; round < ROUNDS; round++)
    await Promise.all(
      [paths.frontDoor(), ...pages].map(async (path) => (await fetch(new URL(path, origin))).text()),
    );
}

/** PostgreSQL's own processes share most of theirs, so only the first is told. */
export const bench: Bench = {
  name: 'memory',
  what: `of each process in MiB, just started with the demo and after ${String(ROUNDS)} rounds over the public pages`,
  async run(print) {
    const folder = throwawayFolder('memory');
    const settings = { PORT: String(await findFreePort()), DATA_DIR: folder.path, LOG_LEVEL: 'error' };
    const product = await startProduct(settings);
    try {
      const children = childrenOf(product.process.pid);
      const measure = () =>
        PARTS.map(([, program]) => {
          const part = children.find(({ command }) => command.includes(program));
          if (!part) throw new Error(`${program} does not run.`);
          return memoryOf(part.pid);
        });
      const before = measure();
      await read(product.environment['PUBLIC_URL'] ?? '');
      const after = measure();
      const rows = PARTS.map(([name], at) => [
        name,
        before[at]?.now ?? 0,
        after[at]?.now ?? 0,
        after[at]?.most ?? 0,
      ]);
      for (const line of formatTable([['', 'started', 'after', 'at most'], ...rows])) print(line);
      return true;
    } finally {
      await product.stop();
      folder.remove();
    }
  },
};
