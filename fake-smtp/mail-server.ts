import { once } from 'node:events';
import type { AddressInfo, Socket } from 'node:net';
import { setImmediate, setTimeout } from 'node:timers/promises';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { Behaviour } from './behaviour.ts';
import type { Mailbox } from './mailbox.ts';

const SIZE_LIMIT = 25 * 2 ** 20;

function reply(responseCode: number, text: string): Error {
  return Object.assign(new Error(text), { responseCode });
}

/** The SMTP side: takes mail from anyone, signed in or not, and keeps it or misbehaves as told. */
export function createMailServer(mailbox: Mailbox, behaviour: Behaviour) {
  const sockets = new Map<number, Socket>();
  const writing = new Set<Promise<unknown>>();

  /** Takes the message in; the text of the answer when it is kept. */
  async function receive(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<string> {
    const { mailFrom, rcptTo } = session.envelope;
    const envelope = {
      from: mailFrom ? mailFrom.address : '',
      to: rcptTo.map((recipient) => recipient.address),
    };
    const rule = behaviour.take(envelope.to, ['drop', 'hang']);
    if (rule && rule.keep !== true) {
      for await (const chunk of stream) void chunk;
    } else {
      const keeping = mailbox.keep(stream, envelope, () => !stream.sizeExceeded);
      writing.add(keeping);
      const kept = await keeping.finally(() => writing.delete(keeping));
      if (!kept) throw reply(552, 'the message is larger than 25 MiB');
      if (!rule) return `kept as ${kept.id}`;
    }
    if (rule?.answer === 'drop') sockets.get(session.remotePort)?.destroy();
    // Neither a dropped nor a hanging connection gets an answer.
    return new Promise(() => undefined);
  }

  const server = new SMTPServer({
    name: 'mail.test',
    banner: 'keeps mail, sends none',
    size: SIZE_LIMIT,
    authOptional: true,
    allowInsecureAuth: true,
    authMethods: ['PLAIN', 'LOGIN', 'CRAM-MD5'],
    disabledCommands: ['STARTTLS'],
    disableReverseLookup: true,
    logger: false,
    closeTimeout: 1,
    onAuth: (auth, _session, callback) => {
      callback(null, { user: auth.username ?? 'anyone' });
    },
    onRcptTo: ({ address }, _session, callback) => {
      const answer = behaviour.take([address], ['refuse', 'defer'])?.answer;
      if (answer === 'refuse') callback(reply(550, '5.1.1 no such mailbox, as told'));
      else if (answer === 'defer') callback(reply(451, '4.2.1 not now, as told'));
      else callback();
    },
    onData: (stream, session, callback) => {
      receive(stream, session).then(
        (text) => {
          callback(null, text);
        },
        (error: unknown) => {
          const code = (error as { responseCode?: number }).responseCode;
          callback(code === undefined ? reply(452, 'the message could not be written') : (error as Error));
        },
      );
    },
  });
  // A client that goes away in the middle is a client's business.
  server.on('error', () => undefined);
  server.server.on('connection', (socket: Socket) => {
    const port = socket.remotePort ?? 0;
    sockets.set(port, socket);
    socket.once('close', () => sockets.delete(port));
  });

  return {
    /** Listens on loopback and gives the port. */
    async listen(port: number): Promise<number> {
      const listening = server.listen(port, '127.0.0.1');
      await once(listening, 'listening');
      return (listening.address() as AddressInfo).port;
    },
    /** Lets what is being written finish, for two seconds at most, then cuts every connection. */
    async close(): Promise<void> {
      const closed = new Promise<void>((resolve) => {
        server.server.close(() => {
          resolve();
        });
      });
      await Promise.race([Promise.allSettled(writing), setTimeout(2000, undefined, { ref: false })]);
      // One turn of the loop, so that the answer to what was just kept still goes out.
      await setImmediate();
      for (const socket of sockets.values()) socket.destroySoon();
      await closed;
    },
  };
}
