import { connect } from 'node:net';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { type Settings } from '../src/server/env.ts';
import { type NodeProcess, type Part, nodePart } from './part.ts';

/** How the product's own processes run: from the build, or from the sources. */
export type Mode = 'built' | 'sources';

export type ServiceOptions = {
  readonly root: string;
  readonly mode: Mode;
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly settings: Settings;
  readonly print: (name: string) => (line: string) => void;
};

function answers(host: string, port: number): Promise<boolean> {
  return new Promise((resolve) => {
    const socket = connect({ host, port });
    socket.on('connect', () => {
      socket.destroy();
      resolve(true);
    });
    socket.on('error', () => {
      resolve(false);
    });
  });
}

/** The web server; from the sources it is Astro's own development server. */
export function webPart({ root, mode, env, settings, print }: ServiceOptions): Part<NodeProcess> {
  const { HOST, PORT } = settings;
  const common = { name: 'web', cwd: root, print: print('web') };
  if (mode === 'built') {
    return nodePart({
      ...common,
      args: ['--enable-source-maps', 'dist/web.mjs'],
      env: { ...env, ROLE: 'web', NODE_ENV: 'production' },
    });
  }
  const astro = join(root, 'node_modules', 'astro', 'astro.js');
  return nodePart({
    ...common,
    args: [astro, 'dev', '--host', HOST, '--port', String(PORT)],
    env: { ...env, ROLE: 'web' },
    waitUntilReady: async (ended) => {
      let alive = true;
      void ended.then(() => (alive = false));
      while (alive && !(await answers(HOST, PORT))) await wait(100);
      if (!alive) await new Promise(() => undefined);
    },
  });
}

/** The worker. */
export function workerPart({ root, mode, env, print }: ServiceOptions): Part<NodeProcess> {
  const args =
    mode === 'built' ? ['--enable-source-maps', 'dist/worker.mjs'] : ['--import', 'tsx', 'src/worker.ts'];
  return nodePart({
    name: 'worker',
    args,
    cwd: root,
    env: { ...env, ROLE: 'worker', ...(mode === 'built' ? { NODE_ENV: 'production' } : {}) },
    print: print('worker'),
  });
}
