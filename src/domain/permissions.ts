import { type Standing } from './roles.ts';

const OWNER = ['owner'] as const;
const EDITORS = ['owner', 'editor'] as const;
const TEAM = ['owner', 'editor', 'moderator'] as const;
const SIGNED_IN = [...TEAM, 'viewer'] as const;
const ANYONE = [...SIGNED_IN, 'anyone'] as const;

/**
 * Who may do what in a workshop: the table of PRODUCT.md, one line a permission, read by the server, the
 * interface and the tests alike.
 */
export const WORKSHOP_PERMISSIONS = {
  'workshop.see-bench': TEAM,
  'workshop.change-settings': OWNER,
  'team.see': TEAM,
  'team.change': OWNER,
  'team.leave': TEAM,
  'build.change': EDITORS,
  'part.change': TEAM,
  'diary.change': EDITORS,
  'footage.change': EDITORS,
  'edit.change': EDITORS,
  'captions.change': EDITORS,
  'worksheet.change': EDITORS,
  'draft-note.change': EDITORS,
  // An editor only if the owner allows it for this workshop.
  'money.see': EDITORS,
  'published-number.change': OWNER,
  'published-number.propose': EDITORS,
  'episode.publish': OWNER,
  'episode.ask-to-publish': EDITORS,
  'announcement.send': OWNER,
  'announcement.ask-to-send': EDITORS,
  'plans.release': OWNER,
  'address.see': OWNER,
  'question.sort': TEAM,
  'question.clear-risky': OWNER,
  'question.answer': TEAM,
  'question.answer-risky': OWNER,
  'question.draft-risky': TEAM,
  'question.ask': SIGNED_IN,
  // It waits only once a link that was sent to the address has been opened.
  'question.ask-by-mail': ANYONE,
  'question.follow': SIGNED_IN,
  'build-list.keep': SIGNED_IN,
  'published.read': ANYONE,
  'plans.download': ANYONE,
  'audience.subscribe': ANYONE,
} as const satisfies Record<string, readonly Standing[]>;

/** What can be done outside any workshop. */
export const ACCOUNT_PERMISSIONS = {
  'account.enter': ['viewer', 'anyone'],
  'account.own': ['viewer'],
  'workshop.make': ['viewer'],
  'invitation.read': ['viewer', 'anyone'],
  'invitation.accept': ['viewer'],
  // An address of media names no workshop; who may see it follows from where it is shown.
  'media.ask': ['viewer', 'anyone'],
  // Whoever holds a mailed link, or the address that a mail server was given.
  'mailed-link.follow': ['viewer', 'anyone'],
  'bounce.report': ['viewer', 'anyone'],
} as const satisfies Record<string, readonly Standing[]>;

export type WorkshopPermission = keyof typeof WORKSHOP_PERMISSIONS;
export type AccountPermission = keyof typeof ACCOUNT_PERMISSIONS;
export type Permission = WorkshopPermission | AccountPermission;

/** Whether a permission is asked about a workshop, not about an account. */
export function isWorkshopPermission(permission: Permission): permission is WorkshopPermission {
  return permission in WORKSHOP_PERMISSIONS;
}

/**
 * Whether someone may do something.
 * @param standing what they are in the workshop in question; outside one, viewer (signed in) or anyone
 */
export function may(standing: Standing, permission: Permission): boolean {
  const table: Record<string, readonly Standing[]> = { ...WORKSHOP_PERMISSIONS, ...ACCOUNT_PERMISSIONS };
  return table[permission]?.includes(standing) ?? false;
}
