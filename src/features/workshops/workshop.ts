import { z } from 'zod';
import { lineOfText } from '../../domain/plain-text.ts';
import { slugSchema, suggestSlug } from '../../domain/slugs.ts';
import { INVITED_ROLES, TEAM_ROLES } from '../../domain/roles.ts';
import { email } from '../../domain/email-address.ts';

export const WORKSHOP_NAME_LENGTH = 80;

/** Address names that the product keeps for itself, or that would mislead. */
export const RESERVED_SLUGS: readonly string[] = [
  'admin',
  'api',
  'bench',
  'centrepop',
  'everyone',
  'feed',
  'help',
  'media',
  'new',
  'official',
  'search',
  'settings',
  'staff',
  'support',
  'team',
  'www',
];

export const workshopName = lineOfText('Enter a name.', WORKSHOP_NAME_LENGTH).refine(
  (name) => /[\p{L}\p{N}]/u.test(name),
  'Use at least one letter or digit.',
);

/** The workshop's name in addresses. */
export const workshopSlug = slugSchema(RESERVED_SLUGS);

const timeZone = z
  .string('Choose a time zone.')
  .refine(
    (zone) => Intl.supportedValuesOf('timeZone').includes(zone) || zone === 'UTC',
    'Choose a time zone from the list.',
  );

/** Languages that captions and pages can be marked as; BCP 47 primary subtags. */
export const LANGUAGES = [
  { value: 'en', label: 'English' },
  { value: 'de', label: 'German' },
  { value: 'es', label: 'Spanish' },
  { value: 'fr', label: 'French' },
  { value: 'it', label: 'Italian' },
  { value: 'nl', label: 'Dutch' },
  { value: 'pl', label: 'Polish' },
  { value: 'pt', label: 'Portuguese' },
  { value: 'sv', label: 'Swedish' },
] as const;
const language = z.enum(
  LANGUAGES.map(({ value }) => value),
  'Choose a language from the list.',
);

export const MakeWorkshopInput = z
  .object({ name: workshopName, slug: z.string('Enter an address name.').trim().optional(), timeZone })
  .transform((input, context) => {
    const parsed = workshopSlug.safeParse(input.slug || suggestSlug(input.name));
    if (parsed.success) return { ...input, slug: parsed.data };
    context.addIssue({ code: 'custom', path: ['slug'], message: parsed.error.issues[0]?.message ?? '' });
    return z.NEVER;
  });

const STALE = 'Open the page again.';
/** As far as PostgreSQL's integer counts. */
const version = z.coerce
  .number(STALE)
  .int(STALE)
  .min(1, STALE)
  .max(2 ** 31 - 1, STALE);
export const workshopParam = z.object({ workshop: z.string().min(1) });

export const ChangeSettingsInput = z.object({
  name: workshopName,
  slug: workshopSlug,
  timeZone,
  language,
  editorsMaySeeOrders: z
    .union([z.literal('on').transform(() => true), z.boolean()], 'Tick it or leave it.')
    .default(false),
  version,
});
export type ChangeSettings = z.output<typeof ChangeSettingsInput>;

export const InviteInput = z.object({ email, role: z.enum(INVITED_ROLES, 'Choose editor or moderator.') });
export type Invite = z.output<typeof InviteInput>;

export const ChangeRoleInput = z.object({ role: z.enum(TEAM_ROLES, 'Choose owner, editor or moderator.') });
export const idParam = z.uuid('That is not an id of ours.');

/** How long an invitation holds, in days. */
export const INVITATION_DAYS = 14;

/** What the token of an invitation's link is signed for. */
export const INVITATION_PURPOSE = 'invitation';

export const MadeWorkshop = z.object({ slug: z.string() });
export const MadeId = z.object({ id: z.uuid() });
const NOT_WHOLE = 'The link is not whole. Open it from the mail again.';
export const AcceptInput = z.object({
  token: z.string(NOT_WHOLE).max(200, NOT_WHOLE),
});

/** The time zones to choose from. */
export function timeZoneOptions(): { value: string; label: string }[] {
  return ['UTC', ...Intl.supportedValuesOf('timeZone').filter((zone) => zone !== 'UTC')].map((zone) => ({
    value: zone,
    label: zone.replaceAll('_', ' '),
  }));
}
