import { z } from 'zod';

/** The longest address that SMTP carries (RFC 5321, 4.5.3.1.3, as corrected by erratum 1690). */
export const EMAIL_LENGTH = 254;

/** An address as people type it, in lower case and without the space around it. */
export const email = z
  .string('Enter your e-mail address.')
  .trim()
  .toLowerCase()
  .max(EMAIL_LENGTH, 'That address is too long.')
  .pipe(z.email('Enter a whole e-mail address, such as jo@example.com.'));
