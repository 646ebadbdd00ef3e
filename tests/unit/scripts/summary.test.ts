import { expect, test } from 'vitest';
import { summarise } from '../../../scripts/summary.ts';

test('the summary names the address, the outbox and the accounts in columns', () => {
  const text = summarise({
    url: 'http://127.0.0.1:4321',
    outboxUrl: 'http://127.0.0.1:20001',
    accounts: [
      { email: 'ada@workshop.test', password: 'first', who: 'owner', secondFactorKey: 'ABC' },
      { email: 'jo@workshop.test', password: 'second', who: 'moderator' },
    ],
  });
  expect(text).toBe(
    [
      '',
      'Centrepop is running: http://127.0.0.1:4321',
      'Its mail is kept here:  http://127.0.0.1:20001',
      'Demo accounts:',
      '  ada@workshop.test  first  owner, second factor key: ABC',
      '  jo@workshop.test   second  moderator',
      'Ctrl-C stops it.',
      '',
    ].join('\n'),
  );
});

test('without demo and stand-ins the summary is the address alone', () => {
  expect(summarise({ url: 'https://diary.example', accounts: [] })).toBe(
    '\nCentrepop is running: https://diary.example\nCtrl-C stops it.\n',
  );
});
