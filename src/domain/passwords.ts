/**
 * Characters in a password: long enough to resist guessing, no rules that make people write it down
 * (NIST SP 800-63B, section 5.1.1, asks for at least 8 and for 64 to be allowed).
 */
export const PASSWORD_LENGTH = { min: 10, max: 128 } as const;
