import { z } from 'zod';

export const SLUG_LENGTH = { min: 2, max: 40 } as const;

/**
 * A name as addresses carry it.
 * @param reserved names that are kept for pages of ours
 */
export function slugSchema(reserved: readonly string[]) {
  return z
    .string('Enter an address name.')
    .trim()
    .toLowerCase()
    .min(SLUG_LENGTH.min, `Use at least ${String(SLUG_LENGTH.min)} characters.`)
    .max(SLUG_LENGTH.max, `Use at most ${String(SLUG_LENGTH.max)} characters.`)
    .regex(/^[a-z0-9]+(-[a-z0-9]+)*$/, 'Use the letters a to z, digits, and single hyphens between them.')
    .refine((slug) => !reserved.includes(slug), 'That name is kept for the product. Choose another.');
}

/**
 * An address name to start from.
 * @returns the name in plain letters with hyphens; empty when nothing of it can be kept
 */
export function suggestSlug(name: string): string {
  return name
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, SLUG_LENGTH.max)
    .replace(/-+$/, '');
}
