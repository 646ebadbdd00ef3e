import { once } from 'node:events';
import { connect } from 'node:net';
import { createInterface } from 'node:readline';

/** A raw SMTP conversation, for what a proper client would not say. */
export async function converse(port: number) {
  const socket = connect(port, '127.0.0.1');
  socket.on('error', () => undefined);
  await once(socket, 'connect');
  const lines = createInterface({ input: socket })[Symbol.asyncIterator]();

  /** The server's next answer as its last line; undefined when it hung up. */
  async function answer(): Promise<string | undefined> {
    for (;;) {
      const { value, done } = await lines.next();
      if (done) return undefined;
      if (!/^\d{3}-/.test(value)) return value;
    }
  }

  return {
    socket,
    answer,
    async say(line: string): Promise<string | undefined> {
      socket.write(`${line}\r\n`);
      return answer();
    },
    write: (text: string) => socket.write(text),
  };
}

/** A conversation that has come as far as the message itself. */
export async function converseToData(port: number, to: string) {
  const talk = await converse(port);
  await talk.answer();
  await talk.say('EHLO bench.test');
  await talk.say('MAIL FROM:<post@centrepop.test>');
  await talk.say(`RCPT TO:<${to}>`);
  await talk.say('DATA');
  return talk;
}
