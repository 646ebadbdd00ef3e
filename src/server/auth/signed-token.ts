import { createHmac, timingSafeEqual } from 'node:crypto';

/**
 * A token that proves a mailed link was ours, without being kept anywhere: an HMAC-SHA-256 of what the link is
 * for and whose it is, so that a mail sent twice carries the same one.
 * @param purpose what the link does; a token for one purpose is worth nothing for another
 * @param id the row the link is about
 */
export function signToken(secret: string, purpose: string, id: string): string {
  return createHmac('sha256', secret).update(`${purpose}\n${id}`).digest('base64url');
}

/** Whether a token is the one signToken gives, compared in constant time. */
export function isSignedToken(secret: string, purpose: string, id: string, token: string): boolean {
  const [expected, given] = [Buffer.from(signToken(secret, purpose, id)), Buffer.from(token)];
  return expected.length === given.length && timingSafeEqual(expected, given);
}
