import type { Rule } from '../../fake-smtp/behaviour.ts';
import type { Message } from '../../fake-smtp/read-message.ts';
import { startFakeSmtp } from '../../fake-smtp/start.ts';
import { throwawayFolder } from './throwaway.ts';

/** Talks to a running fake by its page's address. */
export function outboxAt(page: string) {
  async function messages(query: Record<string, string> = {}): Promise<Message[]> {
    const response = await fetch(`${page}/messages.json?${new URLSearchParams(query).toString()}`);
    return ((await response.json()) as { messages: Message[] }).messages;
  }
  return {
    page,
    messages,
    /** The newest message to an address, waiting up to 10 seconds for one; `after` as in the page's API. */
    async messageTo(to: string, after = ''): Promise<Message> {
      const [message] = await messages({ to, after, wait: '10', limit: '1' });
      if (!message) throw new Error(`No mail to ${to} came within 10 seconds.`);
      return message;
    },
    /** Tells the fake how to treat mail to someone. */
    async tell(rule: Rule): Promise<void> {
      const response = await fetch(`${page}/behaviour`, { method: 'PUT', body: JSON.stringify(rule) });
      if (!response.ok) throw new Error(await response.text());
    },
  };
}

/** A fake SMTP server of a test's own, its folder, and how to end both. */
export async function openOutbox(folder = throwawayFolder('outbox')) {
  const fake = await startFakeSmtp({ folder: folder.path });
  return {
    ...outboxAt(`http://127.0.0.1:${String(fake.pagePort)}`),
    folder: folder.path,
    port: fake.port,
    smtpUrl: `smtp://127.0.0.1:${String(fake.port)}`,
    stop: fake.close,
    async close(): Promise<void> {
      await fake.close();
      folder.remove();
    },
  };
}

export type Outbox = Awaited<ReturnType<typeof openOutbox>>;
