import { describe, expect, test } from 'vitest';
import { keepsAnOwner, type TeamRole } from '../../../src/domain/roles.ts';

const one = [
  { id: 'a', role: 'owner' },
  { id: 'b', role: 'editor' },
] as const;
const two = [...one, { id: 'c', role: 'owner' }] as const;

describe('a team keeps an owner', () => {
  test.each<[string, readonly { id: string; role: TeamRole }[], string, TeamRole | null, boolean]>([
    ['when its only one leaves: no', one, 'a', null, false],
    ['when its only one becomes editor: no', one, 'a', 'editor', false],
    ['when its only one stays owner', one, 'a', 'owner', true],
    ['when someone else leaves', one, 'b', null, true],
    ['when the only one goes but another becomes owner', one, 'b', 'owner', true],
    ['when one of two leaves', two, 'a', null, true],
    ['when one of two becomes moderator', two, 'c', 'moderator', true],
    ['when someone who is not on it leaves', one, 'z', null, true],
    ['when it has nobody: no', [], 'a', 'owner', false],
  ])('%s', (_when, team, id, role, expected) => {
    expect(keepsAnOwner(team, id, role)).toBe(expected);
  });
});
