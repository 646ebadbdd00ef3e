import { cleanLine } from './clean-text.ts';
import { isMailAddress } from './mail-address.ts';

/**
 * Reads MAIL_FROM: `post@example.com` or `Marram Lane <post@example.com>`.
 * @throws RangeError when there is no single address in it
 */
export function readMailFrom(text: string): { readonly name: string; readonly address: string } {
  const [, quoted = '', bracketed] = /^([^<>]*)<([^<>]+)>\s*$/.exec(text) ?? [];
  const address = (bracketed ?? text).trim();
  if (!isMailAddress(address)) {
    throw new RangeError('MAIL_FROM must be one address, such as Marram Lane <post@example.com>.');
  }
  return { name: cleanLine(quoted).replace(/^"(.*)"$/, '$1') || 'Centrepop', address };
}
