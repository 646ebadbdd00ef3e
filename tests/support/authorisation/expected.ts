import { isWorkshopPermission, may, type Permission } from '../../../src/domain/permissions.ts';
import { type Standing } from '../../../src/domain/roles.ts';

/** Everyone who walks, and what they are in the workshop that is walked. */
export const WALKERS = {
  nobody: 'anyone',
  viewer: 'viewer',
  outsider: 'viewer',
  moderator: 'moderator',
  editor: 'editor',
  'owner without a second factor': 'owner',
  owner: 'owner',
} as const satisfies Record<string, Standing>;

export type Walker = keyof typeof WALKERS;

export const REFUSALS = ['sign_in_needed', 'not_found', 'forbidden', 'second_factor_needed'] as const;
export type Verdict = (typeof REFUSALS)[number] | 'allowed';

/** What the table of permissions says of someone, for a workshop whose owner keeps money to themselves. */
export function expectedVerdict(permission: Permission, walker: Walker): Verdict {
  const standing = WALKERS[walker];
  if (!isWorkshopPermission(permission)) {
    return may(standing === 'anyone' ? 'anyone' : 'viewer', permission) ? 'allowed' : 'sign_in_needed';
  }
  if (!may(standing, permission)) {
    if (standing === 'anyone') return 'sign_in_needed';
    return standing === 'viewer' ? 'not_found' : 'forbidden';
  }
  if (permission === 'money.see' && standing === 'editor') return 'forbidden';
  if (walker === 'owner without a second factor' && !may('viewer', permission)) return 'second_factor_needed';
  return 'allowed';
}

/** What an error's code means for the walk: whatever is no refusal has got past the rule. */
export function verdictOf(code: string | null): Verdict {
  return REFUSALS.find((refusal) => refusal === code) ?? 'allowed';
}
