import { type Server } from 'node:http';
import { type Socket } from 'node:net';
import { type PlainRequest, readPlainRequest } from './plain-request.ts';

/** An answer as it goes on the wire. */
export type LaneAnswer = { readonly head: string; readonly body: Buffer | undefined };

export type LaneOptions = {
  /** Gives the answer to a request that needs no judgement, or null to leave it to the HTTP server. */
  answer(request: PlainRequest): LaneAnswer | null;
  /** How long a new connection may say nothing, and one that has been answered. In milliseconds. */
  readonly firstMs: number;
  readonly idleMs: number;
};

export type KeptPageLane = { close(): void };

/**
 * Puts a short lane before an HTTP server for requests that can be answered from memory: Node's own HTTP layer
 * costs more than the answer. A connection stays in the lane while all it sends are plain requests for kept pages,
 * each whole in one read; with the first other byte it becomes an ordinary connection of the server, for good.
 * Call it before anything else listens for connections.
 */
export function openKeptPageLane(server: Server, { answer, firstMs, idleMs }: LaneOptions): KeptPageLane {
  const ordinary = server.listeners('connection') as ((this: Server, socket: Socket) => void)[];
  server.removeAllListeners('connection');
  const inLane = new Map<Socket, () => void>();

  server.on('connection', (socket: Socket) => {
    let answered = false;

    const leave = () => {
      inLane.delete(socket);
      socket
        .off('data', onData)
        .off('end', onEnd)
        .off('error', onGone)
        .off('timeout', onGone)
        .off('close', leave);
      socket.setTimeout(0);
    };
    const onGone = () => {
      socket.destroy();
    };
    const onEnd = () => {
      socket.end();
    };
    const onData = (chunk: Buffer) => {
      // Answers still unread are for the server's own measures against readers who do not read.
      const request = socket.writableLength === 0 ? readPlainRequest(chunk.toString('latin1')) : null;
      const given = request === null ? null : answer(request);
      if (given === null) {
        leave();
        for (const listener of ordinary) listener.call(server, socket);
        socket.unshift(chunk);
        return;
      }
      if (!answered) socket.setTimeout(idleMs);
      answered = true;
      if (given.body === undefined) {
        socket.write(given.head, 'latin1');
      } else {
        socket.cork();
        socket.write(given.head, 'latin1');
        socket.write(given.body);
        socket.uncork();
      }
    };

    inLane.set(socket, leave);
    socket.setTimeout(firstMs);
    socket.on('data', onData).on('end', onEnd).on('error', onGone).on('timeout', onGone).on('close', leave);
  });

  return {
    /** Ends the connections in the lane once what was written to them has left. */
    close() {
      for (const [socket, leave] of inLane) {
        leave();
        socket.on('error', () => socket.destroy());
        socket.end(() => socket.destroy());
      }
    },
  };
}
