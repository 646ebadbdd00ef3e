import { describe, expect, test } from 'vitest';
import {
  ACCOUNT_PERMISSIONS,
  isWorkshopPermission,
  may,
  type Permission,
  WORKSHOP_PERMISSIONS,
} from '../../../src/domain/permissions.ts';
import { type Standing } from '../../../src/domain/roles.ts';

/** Who may do what, as the product's description has it: a row a permission, a letter a standing that may. */
const TABLE: readonly (readonly [Permission, string])[] = [
  ['workshop.change-settings', 'o'],
  ['team.change', 'o'],
  ['build.change', 'oe'],
  ['part.change', 'oem'],
  ['diary.change', 'oe'],
  ['footage.change', 'oe'],
  ['edit.change', 'oe'],
  ['captions.change', 'oe'],
  ['worksheet.change', 'oe'],
  ['draft-note.change', 'oe'],
  ['money.see', 'oe'],
  ['published-number.change', 'o'],
  ['published-number.propose', 'oe'],
  ['episode.publish', 'o'],
  ['episode.ask-to-publish', 'oe'],
  ['announcement.send', 'o'],
  ['announcement.ask-to-send', 'oe'],
  ['plans.release', 'o'],
  ['address.see', 'o'],
  ['question.sort', 'oem'],
  ['question.clear-risky', 'o'],
  ['question.answer', 'oem'],
  ['question.answer-risky', 'o'],
  ['question.draft-risky', 'oem'],
  ['question.ask', 'oemv'],
  ['question.ask-by-mail', 'oemva'],
  ['question.follow', 'oemv'],
  ['build-list.keep', 'oemv'],
  ['published.read', 'oemva'],
  ['plans.download', 'oemva'],
  ['audience.subscribe', 'oemva'],
];

/** What a team needs beside the table, to work at all. */
const OF_THE_TEAM: readonly Permission[] = ['workshop.see-bench', 'team.see', 'team.leave'];

const STANDINGS: readonly Standing[] = ['owner', 'editor', 'moderator', 'viewer', 'anyone'];

describe('who may do what', () => {
  test.each(TABLE)('%s: %s', (permission, letters) => {
    const allowed = STANDINGS.filter((standing) => may(standing, permission));
    expect(allowed.map((standing) => standing[0]).join('')).toBe(letters);
  });

  test('every permission of a workshop stands in the table', () => {
    const listed = [...TABLE.map(([permission]) => permission), ...OF_THE_TEAM].sort();
    expect(Object.keys(WORKSHOP_PERMISSIONS).sort()).toEqual(listed);
  });

  test.each(OF_THE_TEAM)('%s is for the team alone', (permission) => {
    expect(STANDINGS.filter((standing) => may(standing, permission))).toEqual([
      'owner',
      'editor',
      'moderator',
    ]);
  });

  test('whoever may do a thing in a lower standing may do it in a higher one', () => {
    for (const permission of Object.keys(WORKSHOP_PERMISSIONS) as Permission[]) {
      const answers = STANDINGS.map((standing) => may(standing, permission));
      expect(answers, permission).toEqual([...answers].sort((a, b) => Number(b) - Number(a)));
    }
  });

  test('an account’s own things need someone signed in; entering, mailed links, media to look at and reports of bounces do not', () => {
    const forAnyone = Object.keys(ACCOUNT_PERMISSIONS).filter((permission) =>
      may('anyone', permission as Permission),
    );
    expect(forAnyone).toEqual([
      'account.enter',
      'invitation.read',
      'media.ask',
      'mailed-link.follow',
      'bounce.report',
    ]);
    for (const permission of Object.keys(ACCOUNT_PERMISSIONS) as Permission[]) {
      expect(may('viewer', permission)).toBe(true);
      expect(isWorkshopPermission(permission)).toBe(false);
    }
  });

  test('a permission that is not in the table is nobody’s', () => {
    expect(STANDINGS.some((standing) => may(standing, 'no.such' as Permission))).toBe(false);
  });
});
