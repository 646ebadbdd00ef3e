/** Roles in a workshop's team, highest first. Everyone else is a viewer. */
export const TEAM_ROLES = ['owner', 'editor', 'moderator'] as const;
export type TeamRole = (typeof TEAM_ROLES)[number];

/** Roles that an invitation can give; owners are made by owners, from the team. */
export const INVITED_ROLES = ['editor', 'moderator'] as const;
export type InvitedRole = (typeof INVITED_ROLES)[number];

/** What someone is in one workshop: of the team, signed in, or nobody known. */
export type Standing = TeamRole | 'viewer' | 'anyone';

/**
 * Whether a team still has an owner after one member gets another role or leaves.
 * @param team everyone's role now
 * @param memberId whose role changes
 * @param role the new role; null when the member leaves
 */
export function keepsAnOwner(
  team: readonly { readonly id: string; readonly role: TeamRole }[],
  memberId: string,
  role: TeamRole | null,
): boolean {
  return team.some((member) => (member.id === memberId ? role : member.role) === 'owner');
}
