import { describe, expect, test } from 'vitest';
import { isPublicPage, ownPath, paths } from '../../src/paths.ts';

type Table = { readonly [name: string]: ((...parts: string[]) => string) | Table };

/** Every path of the table, made of parts that need encoding where they are names. */
function listPaths(table: Table, prefix = ''): string[] {
  return Object.entries(table).flatMap(([name, entry]) =>
    typeof entry === 'function'
      ? [`${prefix}${name}: ${entry('w 1', 'b/2', '3', '4')}`]
      : listPaths(entry, `${prefix}${name}.`),
  );
}

const all = listPaths(paths as unknown as Table);

test('every address of the product', () => {
  expect(all).toMatchInlineSnapshot(`
    [
      "frontDoor: /",
      "workshop: /w/w%201",
      "workshopFeed: /w/w%201/feed.xml",
      "build: /w/w%201/b%2F2",
      "buildFeed: /w/w%201/b%2F2/feed.xml",
      "episode: /w/w%201/b%2F2/episodes/3?t=4",
      "episodePrint: /w/w%201/b%2F2/episodes/3/print",
      "episodeCaptions: /w/w%201/b%2F2/episodes/3/captions/4.vtt",
      "part: /w/w%201/b%2F2/parts/3",
      "keptWorksheet: /w/w%201/b%2F2/worksheets/3",
      "subscribe: /w/w%201/b%2F2/subscribe",
      "question: /w/w%201/b%2F2/questions/3",
      "ask: /w/w%201/b%2F2/ask?0=3",
      "media: /media/w%201/b%2F2",
      "worksheets: /worksheets",
      "worksheet: /worksheets/w%201",
      "signUp: /sign-up",
      "checkMail: /sign-up/check-mail",
      "confirmAddress: /confirm?token=w%201",
      "signIn: /sign-in?next=w%201",
      "secondStep: /sign-in/code?next=w%201",
      "askSignInLink: /sign-in/link",
      "signInLink: /sign-in/open?token=w%201",
      "askReset: /reset",
      "resetPassword: /reset/password?token=w%201",
      "confirmNewAddress: /account/new-address?token=w%201",
      "account: /account",
      "secondFactor: /account/second-factor?next=w%201",
      "confirmQuestion: /questions/w%201?token=b%2F2",
      "invitation: /invitations/w%201?token=b%2F2",
      "askedToSubscribe: /subscriptions/asked",
      "confirmSubscription: /subscriptions/w%201/confirm?token=b%2F2",
      "leave: /subscriptions/w%201/leave?token=b%2F2",
      "bench: /bench",
      "newWorkshop: /bench/new",
      "today: /bench/w%201",
      "team: /bench/w%201/team",
      "workshopSettings: /bench/w%201/settings",
      "subscribers: /bench/w%201/subscribers",
      "questions: /bench/w%201/questions?list=b%2F2",
      "pasteQuestion: /bench/w%201/questions/paste?build=b%2F2",
      "benchQuestion: /bench/w%201/questions/b%2F2",
      "newBuild: /bench/w%201/new",
      "storage: /bench/w%201/storage",
      "benchBuild: /bench/w%201/b%2F2",
      "diary: /bench/w%201/b%2F2/diary",
      "stages: /bench/w%201/b%2F2/stages",
      "parts: /bench/w%201/b%2F2/parts",
      "benchPart: /bench/w%201/b%2F2/parts/3",
      "importParts: /bench/w%201/b%2F2/parts/import",
      "benchWorksheets: /bench/w%201/b%2F2/worksheets",
      "benchWorksheet: /bench/w%201/b%2F2/worksheets/3",
      "footage: /bench/w%201/b%2F2/footage?3=",
      "addFootage: /bench/w%201/b%2F2/footage/add",
      "cameras: /bench/w%201/b%2F2/footage/cameras",
      "files: /bench/w%201/b%2F2/footage/files",
      "clip: /bench/w%201/b%2F2/footage/clips/3",
      "slate: /slate?zone=w%201",
      "buildSettings: /bench/w%201/b%2F2/settings",
      "episodes: /bench/w%201/b%2F2/episodes",
      "episodesOutAlready: /bench/w%201/b%2F2/episodes/out-already",
      "desk: /bench/w%201/b%2F2/episodes/3",
      "edit: /bench/w%201/b%2F2/episodes/3/edit?version=4",
      "captionMove: /bench/w%201/b%2F2/episodes/3/edit?look=captions#by-captions",
      "leaving: /bench/w%201/b%2F2/episodes/3/text",
      "publish: /bench/w%201/b%2F2/episodes/3/publish",
      "announcement: /bench/w%201/b%2F2/episodes/3/announcement",
      "preview: /bench/w%201/b%2F2/episodes/3/preview",
      "api.me: /api/me",
      "api.account: /api/account/w 1",
      "api.workshops: /api/workshops",
      "api.workshopSettings: /api/workshops/w%201/settings",
      "api.invitations: /api/workshops/w%201/invitations",
      "api.withdrawInvitation: /api/workshops/w%201/invitations/b%2F2/withdraw",
      "api.changeRole: /api/workshops/w%201/team/b%2F2/role",
      "api.removeMember: /api/workshops/w%201/team/b%2F2/remove",
      "api.leaveTeam: /api/workshops/w%201/team/leave",
      "api.inWorkshop: /api/workshops/w%201/b/2",
      "api.inBuild: /api/workshops/w%201/builds/b%2F2/3",
      "api.confirmSubscription: /api/subscriptions/w%201/confirm",
      "api.leave: /api/subscriptions/w%201/leave/b%2F2",
      "api.bounces: /api/bounces/w%201",
      "api.sortQuestion: /api/workshops/w%201/questions/b%2F2/3",
      "api.confirmQuestion: /api/questions/w%201/confirm",
      "api.acceptInvitation: /api/invitations/w%201/accept",
    ]
  `);
});

test('every address is a path of this site, and no two are the same', () => {
  const addresses = all.map((line) => line.replace(/^[^:]*: /, ''));
  for (const address of addresses) expect(new URL(address, 'http://shed.test').pathname).toMatch(/^\//);
  // Its actions are words of ours, never a name.
  const named = addresses.filter((address) => !address.startsWith('/api/account/'));
  expect(named.filter((address) => ownPath(address) !== address)).toEqual([]);
  expect(new Set(addresses).size).toBe(addresses.length);
});

test('a name cannot break out of its place in an address', () => {
  expect(paths.workshop('../admin?x=1#y')).toBe('/w/..%2Fadmin%3Fx%3D1%23y');
  expect(paths.signIn('/bench?a=1&b=2')).toBe('/sign-in?next=%2Fbench%3Fa%3D1%26b%3D2');
});

describe('where to go next', () => {
  test.each(['/', '/bench', '/bench/shed/team?t=1#x', '/a//b', '/%2f%2felsewhere.example'])(
    '%s is ours',
    (path) => {
      expect(ownPath(path)).toBe(path);
      expect(new URL(path, 'http://shed.test').host).toBe('shed.test');
    },
  );

  test.each([
    '//evil',
    '/\\evil',
    '\\\\evil',
    '/\t/evil',
    '/\n/evil',
    'javascript:alert(1)',
    'https://evil.example/',
    'bench',
    '',
    ' /bench',
    '/bench\\..\\x',
    null,
    undefined,
  ])('%j is not, and becomes the front page of the bench', (path) => {
    expect(ownPath(path)).toBe('/bench');
  });
});

test.each([
  ['/', true],
  ['/w/shed', true],
  ['/w/shed/press/ask', false],
  ['/w/shed/ask', true],
  ['/wander', false],
  ['/bench', false],
  ['/sign-in', false],
  ['/api/me', false],
])('%s is rendered once for everyone: %s', (path, expected) => {
  expect(isPublicPage(path)).toBe(expected);
});
