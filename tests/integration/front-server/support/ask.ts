import { type Agent, request, type IncomingHttpHeaders } from 'node:http';
import { once } from 'node:events';
import { connect } from 'node:net';
import { type TestFront } from './start-front.ts';

export type Answer = { status: number; headers: IncomingHttpHeaders; body: Buffer; text: string };

export type Question = {
  method?: string;
  headers?: Record<string, string>;
  body?: string | Buffer;
  agent?: Agent;
};

/** Asks a front server, and gives the answer as it came, not decoded. Without an agent: a connection of its own. */
export function ask(
  front: TestFront,
  path: string,
  { method, headers, body, agent }: Question = {},
): Promise<Answer> {
  return new Promise((resolve, reject) => {
    const asked = request(
      {
        host: '127.0.0.1',
        port: front.port,
        path,
        method: method ?? 'GET',
        headers: { host: front.host, ...headers },
        agent: agent ?? false,
      },
      (res) => {
        const chunks: Buffer[] = [];
        res.on('data', (chunk: Buffer) => chunks.push(chunk));
        res.on('error', reject);
        res.on('end', () => {
          const whole = Buffer.concat(chunks);
          resolve({ status: res.statusCode ?? 0, headers: res.headers, body: whole, text: whole.toString() });
        });
      },
    );
    asked.on('error', reject);
    asked.end(body);
  });
}

/** Sends bytes on a connection of its own and gives all that comes back until the server closes it. */
export async function talk(front: TestFront, ...parts: string[]): Promise<string> {
  const socket = connect(front.port, '127.0.0.1');
  let heard = '';
  socket.on('data', (chunk: Buffer) => {
    heard += chunk.toString('latin1');
  });
  socket.on('error', () => undefined);
  const closed = once(socket, 'close');
  for (const part of parts) {
    socket.write(part, 'latin1');
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
  await closed;
  return heard;
}
