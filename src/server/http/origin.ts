import { BadRequest } from '../errors.ts';

/**
 * Refuses a body that another site sent. Browsers put Origin on every POST; one without it, or with null, was
 * not sent by a page of ours.
 * @param publicUrl PUBLIC_URL
 */
export function requireOwnOrigin(headers: Headers, publicUrl: string): void {
  if (headers.get('origin') !== new URL(publicUrl).origin) {
    throw new BadRequest(
      'This was sent from another site. Nothing was changed; open the page here and try again.',
    );
  }
}
