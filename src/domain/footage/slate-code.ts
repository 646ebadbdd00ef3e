import { type Answer, right, wrong } from '../answer.ts';

/** ISO/IEC 7064, MOD 97-10: two digits after a number, so that all of it leaves 1 when divided by 97. */
const MODULUS = 97n;
const MOST_MS = 9_999_999_999_999;
const DIGITS = 13;

/**
 * What the code on a clock slate says: the instant in milliseconds since 1970 as 13 digits, with two check digits.
 * Digits alone make the smallest code, of the largest squares (ISO/IEC 18004, numeric mode, version 1 at level H).
 * @param at milliseconds since 1970, whole
 */
export function writeSlateCode(at: number): string {
  if (!Number.isInteger(at) || at < 0 || at > MOST_MS) throw new RangeError(`${String(at)} is no instant.`);
  const digits = String(at).padStart(DIGITS, '0');
  const check = MODULUS + 1n - ((BigInt(digits) * 100n) % MODULUS);
  return digits + String(check).padStart(2, '0');
}

/** The instant that a code says, in milliseconds since 1970; or why it is none of a clock slate. */
export function readSlateCode(text: string): Answer<number> {
  if (!/^\d{15}$/.test(text)) return wrong('The code is not that of a clock slate.');
  if (BigInt(text) % MODULUS !== 1n)
    return wrong('The code was read wrong: its check does not come out. Try another frame.');
  return right(Number(text.slice(0, DIGITS)));
}
