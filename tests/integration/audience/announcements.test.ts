import { and, eq } from 'drizzle-orm';
import { Pool } from 'pg';
import { beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { announcements, messages, subscribers } from '../../../src/db/schema/audience.ts';
import { cancelAnnouncement } from '../../../src/features/audience/server/cancel-announcement.ts';
import { draftAnnouncement } from '../../../src/features/audience/server/draft-announcement.ts';
import { getAnnouncement } from '../../../src/features/audience/server/get-announcement.ts';
import { leave } from '../../../src/features/audience/server/leave.ts';
import { listWaitingAnnouncements } from '../../../src/features/audience/server/list-waiting-announcements.ts';
import { pauseAnnouncement } from '../../../src/features/audience/server/pause-announcement.ts';
import { resumeAnnouncement } from '../../../src/features/audience/server/resume-announcement.ts';
import { sendAnnouncement } from '../../../src/features/audience/server/send-announcement.ts';
import { sendMessages } from '../../../src/features/audience/server/send-messages.ts';
import { changeEpisode } from '../../../src/features/episodes/server/change-episode.ts';
import { bringInEpisodes } from '../../../src/features/episodes/server/bring-in-episodes.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { listEpisodes } from '../../../src/features/episodes/server/list-episodes.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { withdrawEpisode } from '../../../src/features/episodes/server/withdraw-episode.ts';
import { POST as bounceRoute } from '../../../src/pages/api/bounces/[token].ts';
import { GET as progressRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/announcement/index.ts';
import { GET as mailRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/announcement/mail.ts';
import { Conflict, Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { openRateLimiter } from '../../../src/server/limits/rate-limiter.ts';
import { bounceToken } from '../../../src/server/mail/bounce-token.ts';
import { type Services } from '../../../src/server/services.ts';
import {
  addSubscribers,
  announce,
  type AnnouncedEpisode,
  publishedEpisode,
  tokensOf,
} from '../../support/audience.ts';
import { callRoute, codeOf } from '../../support/call-route.ts';
import { aWorkshop, inWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const opened = await testServices();
const BOUNCE_SECRET = 'a-secret-for-what-comes-back';
/** The pace is a test of its own; here it is out of the way. */
const services: Services & typeof opened = {
  ...opened,
  settings: { ...opened.settings, MAIL_PER_MINUTE: 60_000, BOUNCE_SECRET },
};
let shed: TestWorkshop;
let press: AnnouncedEpisode;
/** Before every address of one test. */
let name: string;
let count = 0;

beforeAll(async () => {
  shed = await aWorkshop(services);
});
beforeEach(async () => {
  // Those of the whole workshop would be on every list after it.
  await services.db.delete(subscribers);
  count += 1;
  name = `reader${String(count)}`;
  press = await publishedEpisode(shed.owner);
});

const ofBuild = () => ({ workshopId: shed.id, buildId: press.buildId });
const ref = () => ({ build: press.build, episode: press.episode });
const see = () => getAnnouncement(shed.owner, ref());
const statesOf = async (announcementId: string) =>
  (await services.db.select().from(messages).where(eq(messages.announcementId, announcementId)))
    .map(({ state }) => state)
    .sort();
const stateOf = async (id: string) =>
  (await services.db.select().from(announcements).where(eq(announcements.id, id)))[0]!.state;
/** Who was mailed, of this test's addresses, with each mail's Message-ID. */
const mailed = async () =>
  (await services.outbox.messages({ limit: '1000' })).filter(({ to }) => to[0]!.startsWith(name));
/** Makes every message due, so that no test waits for a back-off. */
const hurry = async () => {
  await services.db
    .update(messages)
    .set({ notBefore: new Date(0) })
    .where(eq(messages.state, 'waiting'));
};

describe('an announcement', () => {
  test('mails everyone who confirmed once, with a link to leave in one click', async () => {
    const [subscriber] = await addSubscribers(services, ofBuild(), name, 3);
    const { id } = await announce(shed.owner, press);
    await sendMessages(services, { announcementId: id });
    const mails = await mailed();
    expect(mails.map(({ to }) => to[0]).sort()).toEqual(
      [1, 2, 3].map((n) => `${name}-${String(n)}@example.com`),
    );
    const first = mails.find(({ to }) => to[0] === `${name}-1@example.com`)!;
    const url = `http://shed.test/api/subscriptions/${subscriber!}/leave/${tokensOf(services, subscriber!).leave}`;
    expect(first.headers).toMatchObject({
      'list-unsubscribe': [`<${url}>`],
      'list-unsubscribe-post': ['List-Unsubscribe=One-Click'],
    });
    expect(first.text).toContain(`http://shed.test/w/${shed.slug}/${press.build}/episodes/1`);
    expect(first.from).toContain(shed.owner.workshop.name);
    expect(await stateOf(id)).toBe('sent');
    expect((await see()).progress).toMatchObject({ state: 'sent', total: 3, counts: { sent: 3 } });
  });

  test('is exactly the mail that was shown, but for the leave link', async () => {
    await draftAnnouncement(shed.owner, { ...ref(), words: 'Hello all.\n\nIt turns!', version: 0 });
    await addSubscribers(services, ofBuild(), name, 1);
    const { mail } = await see();
    const { id } = await announce(shed.owner, press);
    await sendMessages(services, { announcementId: id });
    const [message] = await mailed();
    const withoutLeave = (text: string) => text.replace(/http\S+leave\S+/g, 'LEAVE').trim();
    expect(message!.subject).toBe(mail.subject);
    expect(withoutLeave(message!.text)).toBe(withoutLeave(mail.text));
    expect(withoutLeave(message!.html!)).toBe(withoutLeave(mail.html));
    const shown = await callRoute(services, mailRoute, {
      params: { workshop: shed.slug, ...ref() },
      actor: shed.people.owner,
    });
    expect(shown.headers.get('content-security-policy')).toContain('sandbox');
  });

  test('goes to those of the build and of the workshop, once each, and to nobody else', async () => {
    const other = await publishedEpisode(shed.owner);
    await addSubscribers(services, { workshopId: shed.id }, name, 1);
    await addSubscribers(services, ofBuild(), name, 2);
    await addSubscribers(services, { workshopId: shed.id, buildId: other.buildId }, `${name}other`, 1);
    const [asked] = await addSubscribers(services, ofBuild(), `${name}asked`, 1);
    await services.db.update(subscribers).set({ state: 'asked' }).where(eq(subscribers.id, asked!));
    const { id } = await announce(shed.owner, press);
    await sendMessages(services, { announcementId: id });
    expect((await mailed()).map(({ to }) => to[0]).sort()).toEqual([
      `${name}-1@example.com`,
      `${name}-2@example.com`,
    ]);
  });

  test('is refused for an episode that nobody can see, or that was out before', async () => {
    await addSubscribers(services, ofBuild(), name, 1);
    const desk = await getDesk(shed.owner, ref());
    await withdrawEpisode(shed.owner, { ...ref(), version: desk.episode.version });
    await expect(announce(shed.owner, press)).rejects.toThrow(Invalid);
    const { id: draft } = await makeEpisode(shed.owner, { build: press.build, title: 'A draft' });
    await expect(announce(shed.owner, { ...press, episode: draft })).rejects.toThrow(Invalid);
    const old = {
      number: 9,
      title: 'Out long ago',
      address: 'https://video.example/9',
      publishedOn: '2020-01-01',
    };
    await bringInEpisodes(shed.owner, { build: press.build, episodes: [old] });
    const { items } = await listEpisodes(shed.owner, { build: press.build });
    const brought = items.find(({ number }) => number === 9)!;
    await expect(announce(shed.owner, { ...press, episode: brought.id })).rejects.toThrow(
      /announced to nobody/,
    );
  });

  test('asks first whether the video can be watched, and whether old news is meant', async () => {
    const old = await publishedEpisode(shed.owner, '2026-01-10');
    await addSubscribers(services, { workshopId: shed.id, buildId: old.buildId }, name, 1);
    const { version, mail, late, elsewhere } = await getAnnouncement(shed.owner, old);
    expect({ late, elsewhere }).toEqual({ late: true, elsewhere: 'https://video.example/press' });
    const send = (answers: { watchable: boolean; late: boolean }) =>
      sendAnnouncement(shed.owner, { ...old, version, seen: mail.seen, ...answers });
    await expect(send({ watchable: false, late: true })).rejects.toMatchObject({
      fields: { watchable: expect.anything() as unknown },
    });
    await expect(send({ watchable: true, late: false })).rejects.toMatchObject({
      fields: { late: expect.anything() as unknown },
    });
    expect(await mailed()).toEqual([]);
  });

  test('is refused when the mail is no longer the one that was seen', async () => {
    await addSubscribers(services, ofBuild(), name, 1);
    const { version, mail } = await see();
    const { episode } = await getDesk(shed.owner, ref());
    await changeEpisode(shed.owner, {
      ...ref(),
      title: 'Another title',
      about: '',
      number: 1,
      version: episode.version,
    });
    const send = sendAnnouncement(shed.owner, {
      ...ref(),
      version,
      seen: mail.seen,
      watchable: true,
      late: false,
    });
    await expect(send).rejects.toThrow(/changed since you saw it/);
  });

  test('pressed twice is sent once', async () => {
    await addSubscribers(services, ofBuild(), name, 2);
    const outcomes = await Promise.allSettled([announce(shed.owner, press), announce(shed.owner, press)]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    await sendMessages(services, {});
    expect(await mailed()).toHaveLength(2);
    await expect(announce(shed.owner, press)).rejects.toThrow(/Nobody is mailed twice/);
  });

  test('with nobody to mail is refused', async () => {
    await expect(announce(shed.owner, press)).rejects.toThrow(/nobody to mail/);
  });
});

describe('who may announce', () => {
  test('an editor writes it and asks; only the owner sends', async () => {
    await addSubscribers(services, ofBuild(), name, 1);
    await draftAnnouncement(shed.editor, { ...ref(), words: 'It turns!', version: 0 });
    const { version, mail, askedBy } = await see();
    expect(askedBy).toBe(shed.people.editor.name);
    const waiting = await listWaitingAnnouncements(shed.owner, undefined);
    expect(waiting.map(({ href }) => href)).toContain(
      `/bench/${shed.slug}/${press.build}/episodes/${press.episode}/announcement`,
    );
    const input = { ...ref(), version, seen: mail.seen, watchable: true, late: false };
    await expect(sendAnnouncement(shed.editor, input)).rejects.toThrow(Forbidden);
    await expect(draftAnnouncement(shed.moderator, { ...ref(), words: '', version })).rejects.toThrow(
      Forbidden,
    );
    await sendAnnouncement(shed.owner, input);
  });

  test.each([
    ['pause', pauseAnnouncement],
    ['resume', resumeAnnouncement],
    ['cancel', cancelAnnouncement],
  ])('%s is the owner’s, and does not find another workshop’s', async (_what, verb) => {
    await addSubscribers(services, ofBuild(), name, 1);
    await announce(shed.owner, press);
    const outside = await inWorkshop(services, shed.people.outsider, shed.otherSlug);
    await expect(verb(shed.editor, { ...ref(), version: 1 })).rejects.toThrow(Forbidden);
    await expect(verb(outside, { ...ref(), version: 1 })).rejects.toThrow(NotFound);
    await expect(verb(shed.owner, { ...ref(), version: 7 })).rejects.toThrow(Conflict);
  });

  test('writing and sending do not find another workshop’s', async () => {
    const outside = await inWorkshop(services, shed.people.outsider, shed.otherSlug);
    await expect(draftAnnouncement(outside, { ...ref(), words: '', version: 0 })).rejects.toThrow(NotFound);
    await expect(
      sendAnnouncement(outside, { ...ref(), version: 0, seen: 'x', watchable: true, late: true }),
    ).rejects.toThrow(NotFound);
  });
});

describe('while it is being sent', () => {
  test('a paused one sends nothing until it goes on, and one called off nothing more', async () => {
    await addSubscribers(services, ofBuild(), name, 2);
    const { id } = await announce(shed.owner, press);
    await pauseAnnouncement(shed.owner, { ...ref(), version: 1 });
    await sendMessages(services, { announcementId: id });
    expect(await mailed()).toEqual([]);
    await resumeAnnouncement(shed.owner, { ...ref(), version: 2 });
    await cancelAnnouncement(shed.owner, { ...ref(), version: 3 });
    await sendMessages(services, { announcementId: id });
    expect(await mailed()).toEqual([]);
    await expect(resumeAnnouncement(shed.owner, { ...ref(), version: 4 })).rejects.toThrow(NotFound);
  });

  test('after one that was called off half-way, the next mails only the others', async () => {
    await addSubscribers(services, ofBuild(), name, 3);
    const { id } = await announce(shed.owner, press);
    const [first] = await services.db.select().from(messages).where(eq(messages.announcementId, id));
    await services.db.update(messages).set({ state: 'sent' }).where(eq(messages.id, first!.id));
    await cancelAnnouncement(shed.owner, { ...ref(), version: 1 });
    expect((await see()).recipients).toBe(2);
    await announce(shed.owner, press);
    await sendMessages(services, {});
    expect(await mailed()).toHaveLength(2);
  });

  test('whoever leaves gets nothing more', async () => {
    const [left] = await addSubscribers(services, ofBuild(), name, 2);
    const { id } = await announce(shed.owner, press);
    await leave(shed.anyone, { subscriber: left!, token: tokensOf(services, left!).leave });
    await sendMessages(services, { announcementId: id });
    expect((await mailed()).map(({ to }) => to[0])).toEqual([`${name}-2@example.com`]);
    expect(await stateOf(id)).toBe('sent');
  });

  test('an episode that is taken off is announced no more', async () => {
    await addSubscribers(services, ofBuild(), name, 2);
    const { id } = await announce(shed.owner, press);
    const { episode } = await getDesk(shed.owner, ref());
    await withdrawEpisode(shed.owner, { ...ref(), version: episode.version });
    await sendMessages(services, { announcementId: id });
    expect(await mailed()).toEqual([]);
    expect(await stateOf(id)).toBe('cancelled');
  });

  test('two workers at once mail nobody twice', async () => {
    await addSubscribers(services, ofBuild(), name, 40);
    const { id } = await announce(shed.owner, press);
    await Promise.all([1, 2, 3].map(() => sendMessages(services, { announcementId: id })));
    expect(new Set((await mailed()).map(({ to }) => to[0])).size).toBe(40);
    expect(await mailed()).toHaveLength(40);
    expect(await statesOf(id)).toEqual(Array<string>(40).fill('sent'));
  });

  test('all workers together keep to the pace that is set', async () => {
    const pool = new Pool({ connectionString: services.settings.DATABASE_URL });
    const settings = { ...services.settings, MAIL_PER_MINUTE: 180 };
    const slow = { ...services, settings, limiter: openRateLimiter(pool) };
    await addSubscribers(services, ofBuild(), name, 9);
    const { id } = await announce(shed.owner, press);
    const start = Date.now();
    await Promise.all([
      sendMessages(slow, { announcementId: id }),
      sendMessages(slow, { announcementId: id }),
    ]);
    await pool.end();
    const last = Math.max(...(await mailed()).map(({ receivedAt }) => Date.parse(receivedAt)));
    // Three a second: the last three of nine wait two seconds, however many workers there are.
    expect(last - start).toBeGreaterThanOrEqual(2_000);
  });

  test('one claimed by a worker that fell silent goes out under its own Message-ID', async () => {
    await addSubscribers(services, ofBuild(), name, 1);
    const { id } = await announce(shed.owner, press);
    const claimed = { state: 'sending' as const, tries: 1, claimedUntil: new Date(Date.now() + 60_000) };
    const ofIt = eq(messages.announcementId, id);
    const [row] = await services.db.update(messages).set(claimed).where(ofIt).returning();
    const quick = { ...services, mailer: { ...services.mailer, closed: true, send: services.mailer.send } };
    await sendMessages(quick, { announcementId: id });
    expect(await mailed()).toEqual([]);
    await services.db
      .update(messages)
      .set({ claimedUntil: new Date(0) })
      .where(ofIt);
    await sendMessages(services, { announcementId: id });
    expect((await mailed()).map(({ messageId }) => messageId)).toEqual([row!.messageId]);
  });
});

describe('a mail server that', () => {
  test('refuses a recipient: refused, and not tried again', async () => {
    await addSubscribers(services, ofBuild(), name, 2);
    await services.outbox.tell({ recipient: `${name}-1@example.com`, answer: 'refuse' });
    const { id } = await announce(shed.owner, press);
    await sendMessages(services, { announcementId: id });
    expect(await statesOf(id)).toEqual(['refused', 'sent']);
    expect(await stateOf(id)).toBe('sent');
    const [refused] = await services.db
      .select()
      .from(messages)
      .where(and(eq(messages.announcementId, id), eq(messages.state, 'refused')));
    expect(refused!.problem).not.toContain(`${name}-1@example.com`);
    opened.logged.splice(0);
  });

  test('asks to wait: tried again later, with the same Message-ID', async () => {
    await addSubscribers(services, ofBuild(), name, 1);
    await services.outbox.tell({ recipient: `${name}-1@example.com`, answer: 'defer', times: 1 });
    const { id } = await announce(shed.owner, press);
    const hurrying = setInterval(() => void hurry(), 100);
    await sendMessages(services, { announcementId: id });
    clearInterval(hurrying);
    const [row] = await services.db.select().from(messages).where(eq(messages.announcementId, id));
    expect(row).toMatchObject({ state: 'sent', tries: 2 });
    expect((await mailed()).map(({ messageId }) => messageId)).toEqual([row!.messageId]);
    opened.logged.splice(0);
  });

  test('always asks to wait: given up after eight tries', async () => {
    await addSubscribers(services, ofBuild(), name, 1);
    await services.outbox.tell({ recipient: `${name}-1@example.com`, answer: 'defer' });
    const { id } = await announce(shed.owner, press);
    await services.db.update(messages).set({ tries: 7 }).where(eq(messages.announcementId, id));
    await sendMessages(services, { announcementId: id });
    expect(await statesOf(id)).toEqual(['failed']);
    expect(await stateOf(id)).toBe('sent');
    opened.logged.splice(0);
  });
});

describe('what came back', () => {
  test('is reported to one address, and its subscriber is mailed no more', async () => {
    const [gone] = await addSubscribers(services, ofBuild(), name, 1);
    const { id } = await announce(shed.owner, press);
    await sendMessages(services, { announcementId: id });
    const [{ messageId = '' } = {}] = await mailed();
    const report = (token: string) =>
      callRoute(services, bounceRoute, { params: { token }, body: { messageId }, origin: null });
    expect(codeOf(await report(bounceToken('another-secret-of-another')))).toBe('not_found');
    expect(await statesOf(id)).toEqual(['sent']);
    expect((await report(bounceToken(BOUNCE_SECRET))).status).toBe(200);
    expect(await statesOf(id)).toEqual(['bounced']);
    const [row] = await services.db.select().from(subscribers).where(eq(subscribers.id, gone!));
    expect(row!.state).toBe('bounced');
  });

  test('is not listened to without a secret', async () => {
    const answer = await callRoute(opened, bounceRoute, {
      params: { token: bounceToken(BOUNCE_SECRET) },
      body: { messageId: '<x@example.com>' },
    });
    expect(codeOf(answer)).toBe('not_found');
  });
});

describe('its progress', () => {
  test('is asked for cheaply: nothing new is 304, and each message sent is news', async () => {
    await addSubscribers(services, ofBuild(), name, 2);
    const { id } = await announce(shed.owner, press);
    const ask = (tag?: string | null) =>
      callRoute(services, progressRoute, {
        params: { workshop: shed.slug, ...ref() },
        actor: shed.people.owner,
        headers: tag ? { 'if-none-match': tag } : {},
      });
    const first = await ask();
    expect(first.json).toMatchObject({ state: 'sending', total: 2, counts: { waiting: 2 } });
    expect((await ask(first.headers.get('etag'))).status).toBe(304);
    await sendMessages(services, { announcementId: id });
    const last = await ask(first.headers.get('etag'));
    expect(last.json).toMatchObject({ state: 'sent', counts: { sent: 2 } });
  });
});
