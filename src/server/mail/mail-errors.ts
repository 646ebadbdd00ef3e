import { maskAnswer } from './mail-address.ts';

/**
 * The mail will not be taken, now or later: the server answered 5xx to it, or the address cannot be one.
 * `code` is the SMTP reply code (553 for an address refused here). The message holds no whole address.
 */
export class MailRefused extends Error {
  constructor(
    readonly code: number,
    answer: string,
  ) {
    super(`The mail was refused: ${maskAnswer(answer)}`);
    this.name = 'MailRefused';
  }
}

/**
 * The mail did not go out and may later: the server answered 4xx, was not reached, or did not let us in.
 * It may have been taken all the same when the connection broke before the answer. `code` is the SMTP
 * reply code when there was one.
 */
export class MailDeferred extends Error {
  constructor(
    readonly code: number | undefined,
    answer: string,
  ) {
    super(`The mail did not go out yet: ${maskAnswer(answer)}`);
    this.name = 'MailDeferred';
  }
}

// What the server says to who we are, not to the mail: mending the settings lets the same mail through.
const ABOUT_US = new Set(['EAUTH', 'ENOAUTH', 'EOAUTH2', 'ETLS', 'EREQUIRETLS', 'ECONFIG', 'EPROTOCOL']);

/** Sorts what nodemailer throws into refused and deferred. */
export function classifyMailError(error: unknown): MailRefused | MailDeferred {
  const { code, responseCode, response, message } = error as {
    readonly code?: string;
    readonly responseCode?: number;
    readonly response?: string;
    readonly message?: string;
  };
  const answer = response ?? message ?? 'no answer';
  const permanent =
    responseCode !== undefined &&
    responseCode >= 500 &&
    // 503 says that the conversation was out of step; 530 that we have to sign in first.
    responseCode !== 503 &&
    responseCode !== 530 &&
    !ABOUT_US.has(code ?? '');
  if (permanent) return new MailRefused(responseCode, answer);
  // Without a reply code these came from our side of the wire: the same mail would fail again.
  if (responseCode === undefined && (code === 'EENVELOPE' || code === 'EMESSAGE'))
    return new MailRefused(code === 'EENVELOPE' ? 553 : 552, answer);
  return new MailDeferred(responseCode, answer);
}
