import { z } from 'zod';
import { lineOfText, runningText } from '../../domain/plain-text.ts';
import { slugSchema, suggestSlug } from '../../domain/slugs.ts';

export const BUILD_NAME_LENGTH = 80;
export const BUILD_ABOUT_LENGTH = 2000;

/** Words that stand where a build's name would in addresses. */
export const RESERVED_BUILD_SLUGS: readonly string[] = [
  'builds',
  'feed',
  'new',
  'parts',
  'plans',
  'questions',
  'settings',
  'storage',
  'subscribe',
  'team',
];

export const buildName = lineOfText('Enter a name.', BUILD_NAME_LENGTH).refine(
  (name) => /[\p{L}\p{N}]/u.test(name),
  'Use at least one letter or digit.',
);
export const buildSlug = slugSchema(RESERVED_BUILD_SLUGS);
export const buildAbout = runningText(BUILD_ABOUT_LENGTH);

/** What names a build in an address. */
export const buildParams = z.object({ workshop: z.string().min(1), build: z.string().min(1) });

export const MakeBuildInput = z
  .object({
    name: buildName,
    slug: z.string().trim().optional(),
    about: buildAbout,
    plannedEpisodes: z
      .union([z.literal('').transform(() => null), z.coerce.number('Enter a number.').int().min(1).max(999)])
      .nullable()
      .default(null),
  })
  .transform((input, context) => {
    const parsed = buildSlug.safeParse(input.slug || suggestSlug(input.name));
    if (parsed.success) return { ...input, slug: parsed.data };
    context.addIssue({ code: 'custom', path: ['slug'], message: parsed.error.issues[0]?.message ?? '' });
    return z.NEVER;
  });
export type MakeBuild = z.output<typeof MakeBuildInput>;

export const MadeBuild = z.object({ slug: z.string() });

/** A build as pages and other features know it. */
export interface Build {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly about: string;
  readonly visibility: 'private' | 'public';
  readonly plannedEpisodes: number | null;
  readonly currency: string;
  readonly version: number;
}
