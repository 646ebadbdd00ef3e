import type { Mail } from '../../domain/mail.ts';
import { cleanSubject } from './clean-text.ts';
import { mailHtml } from './mail-html.ts';
import { mailText } from './mail-text.ts';

/** A mail as it is handed to the SMTP server. */
export type RenderedMail = { readonly subject: string; readonly text: string; readonly html: string };

/**
 * Sets a mail as text and HTML. The subject is one line of at most 200 characters without control
 * characters, so no header can be slipped in through it.
 * @throws RangeError when an action's address is not http or https
 */
export function renderMail(mail: Mail): RenderedMail {
  return { subject: cleanSubject(mail.subject), text: mailText(mail), html: mailHtml(mail) };
}
