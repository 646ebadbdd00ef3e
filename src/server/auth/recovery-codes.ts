import { randomInt } from 'node:crypto';

/** Without what is mistaken for something else when copied by hand: 0 and o, 1, i and l. */
const ALPHABET = 'abcdefghjkmnpqrstuvwxyz23456789';
const CODES = 10;
const HALF = 5;

/** Ten codes of ten letters and digits with a hyphen in the middle; each is worth 49 bits. */
export function makeRecoveryCodes(): string[] {
  return Array.from({ length: CODES }, () => `${someLetters()}-${someLetters()}`);
}

/** A recovery code as it was made, from how someone typed it: in any case, with or without spaces and hyphens. */
export function readRecoveryCode(typed: string): string {
  const letters = typed.toLowerCase().replace(/[^a-z0-9]/g, '');
  return `${letters.slice(0, HALF)}-${letters.slice(HALF)}`;
}

function someLetters(): string {
  return Array.from({ length: HALF }, () => ALPHABET.charAt(randomInt(ALPHABET.length))).join('');
}
