import { verifyJWT } from 'better-auth/crypto';
import { Invalid } from '../errors.ts';
import { LINK_IS_OVER } from './call-auth.ts';

/** What a mailed link about an address is for; `updateTo` only in one that changes it. */
export interface AddressToken {
  readonly email: string;
  readonly updateTo?: string;
}

/**
 * Reads the token of a mailed link, once its signature and its time have been checked.
 * @param secret AUTH_SECRET
 * @throws Invalid for one that is not ours, or too old
 */
export async function readAddressToken(secret: string, token: string): Promise<AddressToken> {
  const payload = await verifyJWT<Partial<AddressToken>>(token, secret);
  if (typeof payload?.email !== 'string') throw new Invalid({ '': LINK_IS_OVER });
  return { ...payload, email: payload.email };
}
