import { type Server } from 'node:http';
import { type Socket } from 'node:net';

const IDLE_CHECK_MS = 50;

export type GracefulStop = {
  /** True from the moment that `stop` is called. */
  isDraining(): boolean;
  /** Ends when every connection is closed; those still busy after the time are cut off. */
  stop(): Promise<void>;
};

/**
 * Watches a server's connections so that it can be stopped without cutting requests off.
 * @param drainMs how long requests in flight may take to finish
 * @param onStop called as the stop begins, for connections that the server does not know
 */
export function prepareGracefulStop(server: Server, drainMs: number, onStop: () => void): GracefulStop {
  const sockets = new Set<Socket>();
  let stopping: Promise<void> | undefined;
  server.on('connection', (socket) => {
    sockets.add(socket);
    socket.once('close', () => sockets.delete(socket));
  });

  async function drain(): Promise<void> {
    const closed = new Promise<void>((resolve) => {
      server.close(() => {
        resolve();
      });
    });
    onStop();
    // Browsers open connections ahead of need; Node counts those as busy until their first request.
    for (const socket of sockets) if (socket.bytesRead === 0) socket.destroy();
    // An answer whose headers left before the stop keeps its connection; it is idle once the answer is done.
    const idle = setInterval(() => {
      server.closeIdleConnections();
    }, IDLE_CHECK_MS);
    const deadline = setTimeout(() => {
      for (const socket of sockets) socket.destroy();
    }, drainMs);
    server.closeIdleConnections();
    await closed;
    clearInterval(idle);
    clearTimeout(deadline);
  }

  return {
    isDraining: () => stopping !== undefined,
    stop: () => (stopping ??= drain()),
  };
}
