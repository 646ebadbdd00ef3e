import { randomInt } from 'node:crypto';
import { createServer } from 'node:net';
import { keepOrMakeUp, keepPort } from './kept.ts';
import { Trouble } from './trouble.mjs';

/** Below the range from which the kernel takes ports for outgoing connections. */
const FIRST = 20_000;
const LAST = 32_000;

/**
 * Tries whether a port can be listened on.
 * @returns undefined when it can, else the error's code
 */
export function tryPort(port: number, host = '127.0.0.1'): Promise<string | undefined> {
  return new Promise((resolve) => {
    const server = createServer();
    server.on('error', (error: NodeJS.ErrnoException) => {
      resolve(error.code ?? error.message);
    });
    server.listen({ port, host, exclusive: true }, () => {
      server.close(() => {
        resolve(undefined);
      });
    });
  });
}

/** A loopback port that nothing listens on at this moment. */
export async function findFreePort(avoid: readonly number[] = []): Promise<number> {
  for (let attempt = 0; attempt < 200; attempt += 1) {
    const port = randomInt(FIRST, LAST);
    if (!avoid.includes(port) && (await tryPort(port)) === undefined) return port;
  }
  throw new Trouble(`No free port was found between ${String(FIRST)} and ${String(LAST)}.`);
}

/**
 * The loopback port that a part of this copy uses: the one kept, or a new one when there is none or when
 * something else listens on it by now.
 */
export async function choosePort(dataDir: string, name: string): Promise<number> {
  const { ports } = keepOrMakeUp(dataDir);
  const kept = ports[name];
  if (kept !== undefined && (await tryPort(kept)) === undefined) return kept;
  const port = await findFreePort(Object.values(ports));
  keepPort(dataDir, name, port);
  return port;
}

/**
 * Says so when the product's own address cannot be listened on.
 * @throws Trouble
 */
export async function checkWebPort(host: string, port: number): Promise<void> {
  const code = await tryPort(port, host);
  if (code === undefined) return;
  if (code === 'EADDRINUSE') {
    throw new Trouble(
      `Port ${String(port)} is in use. Stop what uses it, or start with another: PORT=${String(port + 1)} npm start`,
    );
  }
  if (code === 'EACCES') {
    throw new Trouble(
      `Port ${String(port)} is not allowed for this account. Use one from 1024 up: PORT=4321 npm start`,
    );
  }
  throw new Trouble(
    `HOST is ${host}, which is not an address of this machine (${code}). Set HOST to one that is.`,
  );
}
