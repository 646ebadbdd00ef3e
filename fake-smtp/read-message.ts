import { simpleParser, type ParsedMail } from 'mailparser';
import type { Kept } from './mailbox.ts';

/** A kept message, read. */
export type Message = {
  readonly id: string;
  /** Both times as ISO 8601 in UTC; `date` is the header's. */
  readonly receivedAt: string;
  readonly date: string | undefined;
  readonly envelope: Kept['envelope'];
  /** Bare addresses of the envelope. */
  readonly to: readonly string[];
  /** As the From header shows it. */
  readonly from: string;
  readonly replyTo: string | undefined;
  readonly subject: string;
  readonly messageId: string | undefined;
  /** Every header by its name in lower case, a value a line of that name, unfolded. */
  readonly headers: Readonly<Record<string, readonly string[]>>;
  readonly text: string;
  readonly html: string | undefined;
  /** Every http and https address in the message, each once, in order. */
  readonly links: readonly string[];
  readonly attachments: readonly { readonly name: string; readonly type: string; readonly bytes: number }[];
};

/** Web addresses in a text, without the punctuation that follows them. */
export const LINK = /https?:\/\/[^\s<>"']+[^\s<>"'.,;:!?)\]]/g;

function hrefs(html: string): string[] {
  return [...html.matchAll(/\shref\s*=\s*(?:"([^"]*)"|'([^']*)')/gi)]
    .map((match) => (match[1] ?? match[2] ?? '').replaceAll('&amp;', '&').trim())
    .filter((address) => /^https?:/i.test(address));
}

function readHeaders(parsed: ParsedMail): Record<string, string[]> {
  const headers: Record<string, string[]> = {};
  for (const { key, line } of parsed.headerLines) {
    const value = line
      .slice(line.indexOf(':') + 1)
      .replace(/\r?\n(?=[ \t])/g, '')
      .trim();
    (headers[key] ??= []).push(value);
  }
  return headers;
}

/** Reads a message as it was received. */
export async function readMessage(kept: Kept, raw: Buffer): Promise<Message> {
  const parsed = await simpleParser(raw, { skipTextToHtml: true });
  const html = parsed.html === false ? undefined : parsed.html;
  const text = parsed.text ?? '';
  return {
    id: kept.id,
    receivedAt: kept.receivedAt.toISOString(),
    date: parsed.date?.toISOString(),
    envelope: kept.envelope,
    to: kept.envelope.to,
    from: parsed.from?.text ?? '',
    replyTo: parsed.replyTo?.text,
    subject: parsed.subject ?? '',
    messageId: parsed.messageId,
    headers: readHeaders(parsed),
    text,
    html,
    links: [...new Set([...(text.match(LINK) ?? []), ...hrefs(html ?? '')])],
    attachments: parsed.attachments
      .filter(({ related }) => !related)
      .map(({ filename, contentType, size }) => ({
        name: filename ?? 'without a name',
        type: contentType,
        bytes: size,
      })),
  };
}
