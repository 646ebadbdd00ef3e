import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, test } from 'vitest';
import { subscribers } from '../../../src/db/schema/audience.ts';
import { confirmSubscription } from '../../../src/features/audience/server/confirm-subscription.ts';
import { countSubscribers } from '../../../src/features/audience/server/count-subscribers.ts';
import { exportSubscribers } from '../../../src/features/audience/server/export-subscribers.ts';
import { forgetUnconfirmed } from '../../../src/features/audience/server/forget-unconfirmed.ts';
import { leave } from '../../../src/features/audience/server/leave.ts';
import { listSubscribers } from '../../../src/features/audience/server/list-subscribers.ts';
import { subscribe } from '../../../src/features/audience/server/subscribe.ts';
import { POST as subscribeToBuildRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/subscribers.ts';
import { POST as subscribeRoute } from '../../../src/pages/api/workshops/[workshop]/subscribers/index.ts';
import { POST as confirmRoute } from '../../../src/pages/api/subscriptions/[subscriber]/confirm.ts';
import {
  GET as leavePage,
  POST as leaveRoute,
} from '../../../src/pages/api/subscriptions/[subscriber]/leave/[token].ts';
import { Forbidden, NotFound } from '../../../src/server/errors.ts';
import { addSubscribers, publishedEpisode, tokensOf } from '../../support/audience.ts';
import { callRoute, codeOf, fieldsOf } from '../../support/call-route.ts';
import { aWorkshop, inWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let shed: TestWorkshop;
let build: string;
let buildId: string;
beforeAll(async () => {
  shed = await aWorkshop(services);
  ({ build, buildId } = await publishedEpisode(shed.owner));
});

async function rowOf(email: string) {
  return (await services.db.select().from(subscribers).where(eq(subscribers.email, email)))[0]!;
}

/** Asks and follows the mailed link. */
async function subscribed(email: string, of: { build?: string } = {}) {
  await subscribe(shed.anyone, { email, ...of });
  const { id } = await rowOf(email);
  const token = tokensOf(services, id).confirm;
  await confirmSubscription(shed.anyone, { subscriber: id, token });
  return id;
}

describe('asking', () => {
  test('mails a link that shows a page, and only what that page sends confirms', async () => {
    await subscribe(shed.anyone, { email: 'ida@example.com', build });
    const message = await services.outbox.messageTo('ida@example.com');
    expect(message.subject).toContain('shall we mail you the next episode?');
    const link = new URL(message.links[0]!);
    const { id, state } = await rowOf('ida@example.com');
    expect(link.pathname).toBe(`/subscriptions/${id}/confirm`);
    expect(state).toBe('asked');
    const token = link.searchParams.get('token')!;
    const answer = await callRoute(services, confirmRoute, { params: { subscriber: id }, form: { token } });
    expect(answer.status).toBe(303);
    expect(answer.location).toContain(`/subscriptions/${id}/confirm`);
    expect((await rowOf('ida@example.com')).state).toBe('confirmed');
  });

  test('answers a known address like an unknown one, and tells its owner by mail', async () => {
    await subscribed('known@example.com');
    const { id: last } = await services.outbox.messageTo('known@example.com');
    const ask = async (email: string) => {
      const { status, json, setCookies } = await callRoute(services, subscribeRoute, {
        params: { workshop: shed.slug },
        body: { email },
      });
      return { status, json, setCookies };
    };
    expect(await ask('known@example.com')).toEqual(await ask('new@example.com'));
    const message = await services.outbox.messageTo('known@example.com', last);
    expect(message.subject).toContain('you are on the list already');
    expect((await rowOf('known@example.com')).state).toBe('confirmed');
  });

  test('works as a plain form, and shows a refused one again with a sentence at the field', async () => {
    const params = { workshop: shed.slug, build };
    const taken = await callRoute(services, subscribeToBuildRoute, {
      params,
      form: { email: 'plain@example.com' },
    });
    expect(taken).toMatchObject({ status: 303, location: '/subscriptions/asked' });
    const refused = await callRoute(services, subscribeToBuildRoute, { params, form: { email: 'plain@' } });
    expect(refused.page).toMatchObject({
      path: `/w/${shed.slug}/${build}/subscribe`,
      form: {
        values: { email: 'plain@' },
        errors: { email: expect.stringContaining('whole e-mail address') as unknown },
      },
    });
  });

  test('is counted by address written to', async () => {
    const ask = () =>
      callRoute(services, subscribeRoute, {
        params: { workshop: shed.slug },
        body: { email: 'Often@example.com' },
      });
    for (let tries = 0; tries < 5; tries += 1) expect((await ask()).status).toBe(200);
    expect(codeOf(await ask())).toBe('too_many');
  });

  test('does not find a private build, nor another workshop’s', async () => {
    const outside = await inWorkshop(services, null, shed.otherSlug);
    await expect(subscribe(outside, { email: 'a@example.com', build })).rejects.toThrow(NotFound);
  });

  test('keeps nothing in the database with which a link could be made', async () => {
    const id = await subscribed('secret@example.com');
    const { confirm, leave: leaving } = tokensOf(services, id);
    const kept = JSON.stringify(await rowOf('secret@example.com'));
    expect(kept).not.toContain(confirm);
    expect(kept).not.toContain(leaving);
  });
});

describe('confirming', () => {
  test('takes no token but the one that was mailed', async () => {
    await subscribe(shed.anyone, { email: 'other@example.com' });
    const { id } = await rowOf('other@example.com');
    const token = tokensOf(services, id).leave;
    await expect(confirmSubscription(shed.anyone, { subscriber: id, token })).rejects.toThrow(NotFound);
  });

  test('twice does no harm; after leaving, or after two weeks, the link is over', async () => {
    const id = await subscribed('twice@example.com');
    const { confirm: token, leave: leaving } = tokensOf(services, id);
    await confirmSubscription(shed.anyone, { subscriber: id, token });
    await leave(shed.anyone, { subscriber: id, token: leaving });
    const again = () => callRoute(services, confirmRoute, { params: { subscriber: id }, body: { token } });
    expect(fieldsOf(await again())).toEqual({ '': expect.stringContaining('over') as unknown });
    await subscribe(shed.anyone, { email: 'twice@example.com' });
    await services.db
      .update(subscribers)
      .set({ askedAt: new Date(0) })
      .where(eq(subscribers.id, id));
    expect(codeOf(await again())).toBe('invalid');
  });

  test('that never happens has the address erased', async () => {
    await subscribe(shed.anyone, { email: 'stranger@example.com' });
    await subscribe(shed.anyone, { email: 'late@example.com' });
    await services.db
      .update(subscribers)
      .set({ askedAt: new Date(0) })
      .where(eq(subscribers.email, 'stranger@example.com'));
    await forgetUnconfirmed(services, {});
    expect(await rowOf('stranger@example.com')).toBeUndefined();
    expect(await rowOf('late@example.com')).toBeDefined();
  });

  test('is refused when another site sends it', async () => {
    const answer = await callRoute(services, confirmRoute, {
      params: { subscriber: await subscribed('origin@example.com') },
      body: { token: 'x' },
      origin: 'https://elsewhere.example',
    });
    expect(codeOf(answer)).toBe('bad_request');
  });
});

describe('leaving', () => {
  test('takes one POST of a mailbox, from anywhere and without a redirect', async () => {
    const id = await subscribed('one-click@example.com');
    const params = { subscriber: id, token: tokensOf(services, id).leave };
    const answer = await callRoute(services, leaveRoute, {
      params,
      form: { 'List-Unsubscribe': 'One-Click' },
      origin: null,
    });
    expect(answer.status).toBe(200);
    expect((await rowOf('one-click@example.com')).state).toBe('left');
    const again = await callRoute(services, leaveRoute, {
      params,
      form: { 'List-Unsubscribe': 'One-Click' },
    });
    expect(again.status).toBe(200);
  });

  test('by GET shows a page and leaves nobody', async () => {
    const id = await subscribed('scanner@example.com');
    const token = tokensOf(services, id).leave;
    const answer = await callRoute(services, leavePage, { params: { subscriber: id, token } });
    expect(answer).toMatchObject({ status: 303, location: `/subscriptions/${id}/leave?token=${token}` });
    expect((await rowOf('scanner@example.com')).state).toBe('confirmed');
  });

  test('takes no token but one’s own', async () => {
    const id = await subscribed('mine@example.com');
    const token = tokensOf(services, await subscribed('theirs@example.com')).leave;
    const answer = await callRoute(services, leaveRoute, { params: { subscriber: id, token }, body: {} });
    expect(codeOf(answer)).toBe('not_found');
  });

  test('a build also ends the workshop’s list, but not that of another build', async () => {
    const other = await publishedEpisode(shed.owner);
    const email = 'many-1@example.com';
    const [whole, one, two] = [
      (await addSubscribers(services, { workshopId: shed.id }, 'many', 1))[0]!,
      (await addSubscribers(services, { workshopId: shed.id, buildId }, 'many', 1))[0]!,
      (await addSubscribers(services, { workshopId: shed.id, buildId: other.buildId }, 'many', 1))[0]!,
    ];
    await leave(shed.anyone, { subscriber: one, token: tokensOf(services, one).leave });
    const rows = await services.db.select().from(subscribers).where(eq(subscribers.email, email));
    expect(Object.fromEntries(rows.map(({ id, state }) => [id, state]))).toEqual({
      [whole]: 'left',
      [one]: 'left',
      [two]: 'confirmed',
    });
  });
});

describe('the addresses', () => {
  test.each(['listSubscribers', 'countSubscribers', 'exportSubscribers'] as const)(
    '%s is for the owner alone',
    async (name) => {
      const read = { listSubscribers, countSubscribers, exportSubscribers }[name];
      const call = (context: typeof shed.owner) =>
        (read as (c: typeof shed.owner, i: object) => Promise<unknown>)(context, {});
      await expect(call(shed.editor)).rejects.toThrow(Forbidden);
      await expect(call(shed.moderator)).rejects.toThrow(Forbidden);
      await expect(call(shed.viewer)).rejects.toThrow(NotFound);
      await expect(call(shed.owner)).resolves.toBeDefined();
    },
  );

  test('are listed for their own workshop only, page by page', async () => {
    const outside = await inWorkshop(services, shed.people.outsider, shed.otherSlug);
    await addSubscribers(services, { workshopId: outside.workshop.id }, 'outside', 201);
    const first = await listSubscribers(outside, {});
    const second = await listSubscribers(outside, { before: first.nextCursor ?? '' });
    expect([first.items.length, second.items.length, second.nextCursor]).toEqual([200, 1, null]);
    expect((await countSubscribers(outside, undefined)).confirmed).toBe(201);
    const { items } = await listSubscribers(shed.owner, {});
    expect(items.some(({ email }) => email.startsWith('outside'))).toBe(false);
  });

  test('go into a list in which no cell is a formula', async () => {
    await subscribe(shed.anyone, { email: '=1+1@example.com' });
    const { text } = await exportSubscribers(shed.owner, undefined);
    expect(text).toContain("\r\n'=1+1@example.com,asked,");
    expect(text).not.toContain('\r\n=');
  });
});
