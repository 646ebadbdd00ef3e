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
  'subscribers',
  'team',
];

export const buildName = lineOfText('Enter a name.', BUILD_NAME_LENGTH).refine(
  (name) => /[\p{L}\p{N}]/u.test(name),
  'Use at least one letter or digit.',
);
export const buildSlug = slugSchema(RESERVED_BUILD_SLUGS);
export const buildAbout = runningText(BUILD_ABOUT_LENGTH);

const plannedEpisodes = z
  .union(
    [z.literal('').transform(() => null), z.coerce.number().int().min(1).max(999)],
    'Enter a whole number from 1 to 999, or leave it empty.',
  )
  .nullable()
  .default(null);

const STALE = 'Open the page again.';

/** The version that a change saw; carried by every form and request that changes a row several people edit. */
export const buildVersion = z.coerce
  .number(STALE)
  .int(STALE)
  .min(1, STALE)
  .max(2 ** 31 - 1, STALE);

/** What names a build in an address. */
export const buildParams = z.object({ workshop: z.string().min(1), build: z.string().min(1) });

export const MakeBuildInput = z
  .object({
    name: buildName,
    slug: z.string().trim().optional(),
    about: buildAbout,
    plannedEpisodes,
  })
  .transform((input, context) => {
    const parsed = buildSlug.safeParse(input.slug || suggestSlug(input.name));
    if (parsed.success) return { ...input, slug: parsed.data };
    context.addIssue({ code: 'custom', path: ['slug'], message: parsed.error.issues[0]?.message ?? '' });
    return z.NEVER;
  });
export type MakeBuild = z.output<typeof MakeBuildInput>;

/** The currencies to choose from; ISO 4217. Any other the browser and the server know is taken, too. */
export function currencyOptions(): { value: string; label: string; detail: string }[] {
  const names = new Intl.DisplayNames('en', { type: 'currency' });
  return Intl.supportedValuesOf('currency').map((value) => ({
    value,
    label: value,
    detail: names.of(value) ?? value,
  }));
}

export const ChangeBuildInput = z.object({
  name: buildName,
  slug: buildSlug,
  about: buildAbout,
  plannedEpisodes,
  currency: z
    .string('Choose a currency.')
    .refine((code) => Intl.supportedValuesOf('currency').includes(code), 'Choose a currency from the list.'),
  visibility: z.enum(['private', 'public'], 'Choose who may see it.'),
  version: buildVersion,
});
export type ChangeBuild = z.output<typeof ChangeBuildInput>;

/** How long what was deleted can be brought back, in days. */
export const KEPT_DAYS = 30;

export const DeleteBuildInput = z.object({ version: buildVersion });

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
