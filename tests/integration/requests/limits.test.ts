import { expect, test } from 'vitest';
import { may } from '../../../src/domain/permissions.ts';
import { POST as askLinkRoute } from '../../../src/pages/api/account/ask-link.ts';
import { POST as askResetRoute } from '../../../src/pages/api/account/ask-reset.ts';
import { POST as signInRoute } from '../../../src/pages/api/account/sign-in.ts';
import { POST as signUpRoute } from '../../../src/pages/api/account/sign-up.ts';
import { POST as inviteRoute } from '../../../src/pages/api/workshops/[workshop]/invitations/index.ts';
import { type RuledRoute } from '../../../src/server/http/api-route.ts';
import { exportedFunctions, isRoute, sourceFiles } from '../../support/authorisation/find-ruled.ts';
import { tripwireServices } from '../../support/authorisation/tripwires.ts';
import { callRoute, codeOf, type RouteCall } from '../../support/call-route.ts';
import { aWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
const shed = await aWorkshop(services);
const limited = tripwireServices(services, { limiter: services.limiter });
const routes = (await exportedFunctions(sourceFiles('src/pages/api', /\.ts$/))).filter(isRoute);

/** How often something goes through before it is too much; asked from a new address each time unless it names one. */
async function triesOf(route: RuledRoute, call: (index: number) => RouteCall): Promise<number> {
  for (let index = 0; index < 200; index += 1) {
    const clientAddress = `198.51.${String(Math.floor(index / 200))}.${String(index)}`;
    const answer = await callRoute(limited, route, { clientAddress, ...call(index) });
    if (codeOf(answer) === 'too_many') {
      expect(answer.status).toBe(429);
      expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
      return index;
    }
    expect(codeOf(answer)).toBe('reached');
  }
  return Infinity;
}

test('signing in is limited by e-mail address, however it is written and from wherever', async () => {
  const body = (index: number) => ({
    email: index % 2 ? 'TRY@example.com' : 'try@example.com',
    password: 'p',
  });
  expect(await triesOf(signInRoute, (index) => ({ body: body(index) }))).toBe(10);
});

test('signing up, resets and sign-in links are limited by e-mail address', async () => {
  const email = 'again@example.com';
  const body = { email, name: 'Again', password: 'long-enough-to-be-one' };
  expect(await triesOf(signUpRoute, () => ({ body }))).toBe(5);
  expect(await triesOf(askResetRoute, () => ({ body: { email } }))).toBe(3);
  expect(await triesOf(askLinkRoute, () => ({ body: { email } }))).toBe(5);
});

test('asking is limited by network address: IPv4 whole', async () => {
  const from = (index: number) => ({
    clientAddress: '203.0.113.5',
    body: { email: `person-${String(index)}@example.com` },
  });
  expect(await triesOf(askResetRoute, from)).toBe(20);
  const neighbour = { clientAddress: '203.0.113.6', body: { email: 'neighbour@example.com' } };
  expect(codeOf(await callRoute(limited, askResetRoute, neighbour))).toBe('reached');
});

test('asking is limited by network address: IPv6 by its /64', async () => {
  const from = (index: number) => ({
    clientAddress: `2001:db8:0:1::${index.toString(16)}`,
    body: { email: `six-${String(index)}@example.com` },
  });
  expect(await triesOf(askResetRoute, from)).toBe(20);
  const next = { clientAddress: '2001:db8:0:2::1', body: { email: 'next-door@example.com' } };
  expect(codeOf(await callRoute(limited, askResetRoute, next))).toBe('reached');
});

test('inviting is limited by account', async () => {
  const invite = (index: number) => ({
    params: { workshop: shed.slug },
    actor: shed.people.owner,
    body: { email: `guest-${String(index)}@example.com`, role: 'editor' },
  });
  const { tries } = inviteRoute.route.limit!.find(({ by }) => by === 'account')!;
  expect(await triesOf(inviteRoute, invite)).toBe(tries);
});

test('a form that came too often shows its page again, with when to try again', async () => {
  const form = { email: 'form@example.com', next: '/bench', password: 'secret-secret' };
  let answer = await callRoute(limited, signInRoute, { form });
  for (let tries = 0; answer.status !== 429 && tries < 20; tries += 1)
    answer = await callRoute(limited, signInRoute, { form });
  expect(answer.status).toBe(429);
  expect(Number(answer.headers.get('retry-after'))).toBeGreaterThan(0);
  expect(answer.page?.form.values).toEqual({ email: 'form@example.com', next: '/bench' });
  expect(answer.page?.form.message).toMatch(/^Too many tries\. Wait \d+ (seconds|minutes)/);
});

test('what anyone may send without signing in is limited by network address', () => {
  const open = routes.filter(
    ({ file, thing: { route } }) =>
      route.verb.rule.kind === 'write' &&
      may('anyone', route.verb.rule.may) &&
      !file.endsWith('account/sign-out.ts') &&
      // Mail services send many of these from one address each, and a token that nobody guesses is their authority.
      route.origin !== 'any' &&
      route.limit?.some(({ by }) => by === 'address') !== true,
  );
  expect(open.map(({ file }) => file)).toEqual([]);
});
