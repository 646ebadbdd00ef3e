/** Extra header lines by name. */
export type MailHeaders = Readonly<Record<string, string>>;

// What the mailer itself writes: a caller who could set these could write to someone else.
const OURS =
  /^(from|sender|to|cc|bcc|reply-to|return-path|subject|date|message-id|mime-version|auto-submitted|content-.*|dkim-.*|received|resent-.*)$/i;
const NAME = /^[A-Za-z][A-Za-z0-9-]{0,75}$/;
const MESSAGE_ID = /^<[A-Za-z0-9!#$%&'*+/=?^_`{|}~.-]{1,128}@[A-Za-z0-9.-]{1,128}>$/;

function headerLine(name: string, value: string) {
  if (!NAME.test(name) || OURS.test(name)) throw new RangeError(`A mail cannot be given the header ${name}.`);
  if (/[\p{Cc}\u2028\u2029]/u.test(value) || value.trim() === '' || value.length > 900) {
    throw new RangeError(`The value of the header ${name} is not one line.`);
  }
  // Plain values are written as they stand: folding or splitting one-click headers breaks them.
  return /^[\x20-\x7e]+$/.test(value) ? { prepared: true, foldLines: false, value } : value;
}

/**
 * The caller's extra headers and Message-ID in the mailer's form, with the mark that a machine sent this.
 * @throws RangeError for a name that is the mailer's own, a value of more than one line, or a Message-ID
 *   without angle brackets
 */
export function mailHeaders(headers: MailHeaders = {}, messageId?: string) {
  if (messageId !== undefined && !MESSAGE_ID.test(messageId)) {
    throw new RangeError('A Message-ID looks like <something@example.com>.');
  }
  const lines = Object.entries(headers).map(([name, value]) => [name, headerLine(name, value)] as const);
  return {
    headers: Object.fromEntries([['Auto-Submitted', 'auto-generated'] as const, ...lines]),
    ...(messageId !== undefined && { messageId }),
  };
}
