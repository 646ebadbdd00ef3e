import { isSignedToken, signToken } from '../auth/signed-token.ts';

const PURPOSE = 'bounces';

/**
 * What stands in the address to which a mail server reports what came back. There is one for a whole copy.
 * @param secret BOUNCE_SECRET
 */
export function bounceToken(secret: string): string {
  return signToken(secret, PURPOSE, '');
}

/** Whether a report was sent to that address. */
export function isBounceToken(secret: string, token: string): boolean {
  return isSignedToken(secret, PURPOSE, '', token);
}
