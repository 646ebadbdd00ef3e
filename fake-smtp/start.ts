import { createBehaviour } from './behaviour.ts';
import { createMailServer } from './mail-server.ts';
import { openMailbox } from './mailbox.ts';
import { createPageServer } from './page-server.ts';

export type FakeSmtpOptions = {
  /** The folder of the messages; made when it is not there. */
  readonly folder: string;
  /** Ports on 127.0.0.1; 0 or nothing takes any free one. */
  readonly port?: number;
  readonly pagePort?: number;
};

/** Cannot start, with the reason as a sentence. */
export class CannotStart extends Error {}

function reason(error: unknown, what: string): CannotStart {
  const code = (error as NodeJS.ErrnoException).code;
  if (code === 'EADDRINUSE') return new CannotStart(`${what} is in use by another program.`);
  return new CannotStart(`${what} cannot be used (${code ?? String(error)}).`);
}

async function attempt<T>(what: string, work: Promise<T>): Promise<T> {
  try {
    return await work;
  } catch (error) {
    throw reason(error, what);
  }
}

/**
 * Starts an SMTP server that keeps every message and sends none, and its outbox page, both on 127.0.0.1.
 * @throws CannotStart when a port is taken or the folder cannot be written to
 */
export async function startFakeSmtp({ folder, port = 0, pagePort = 0 }: FakeSmtpOptions) {
  const mailbox = await attempt(`The folder ${folder}`, openMailbox(folder));
  const behaviour = createBehaviour();
  const mail = createMailServer(mailbox, behaviour);
  const page = createPageServer(mailbox, behaviour);
  const mailPort = await attempt(`Port ${String(port)} on 127.0.0.1`, mail.listen(port));
  try {
    const outboxPort = await attempt(`Port ${String(pagePort)} on 127.0.0.1`, page.listen(pagePort));
    return {
      port: mailPort,
      pagePort: outboxPort,
      /** Lets messages being written finish, then ends both servers. */
      async close(): Promise<void> {
        await Promise.all([mail.close(), page.close()]);
      },
    };
  } catch (error) {
    await mail.close();
    throw error;
  }
}
