import { eq } from 'drizzle-orm';
import { type APIContext } from 'astro';
import { describe, expect, test } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { builds } from '../../../src/db/schema/builds.ts';
import { diaryEntries, diaryPhotos } from '../../../src/db/schema/diary.ts';
import { editions, episodes, videos } from '../../../src/db/schema/episodes.ts';
import { GET } from '../../../src/pages/media/[file]/[variant].ts';
import { readSession } from '../../../src/server/auth/session.ts';
import { type Person } from '../../../src/seed/people.ts';
import { makeFilm, makePhoto } from '../../support/media-samples.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';
import { aBuild, uploadAndCheck } from '../../support/uploads.ts';

const services = await storageServices();
const workshop = await aWorkshop(services);
const build = await aBuild(services, workshop.id, { visibility: 'public' });
const { file: film } = await uploadAndCheck(workshop.editor, build.slug, 'EP4 "cut".mp4', await makeFilm());
const { file: photo } = await uploadAndCheck(workshop.editor, build.slug, 'seat.jpg', await makePhoto());
const { people } = workshop;

async function ask(
  file: string,
  variant: string,
  person: Person | null = null,
  init: { method?: string; headers?: Record<string, string> } = {},
): Promise<Response> {
  const headers = new Headers(init.headers);
  const cookie = person?.headers.get('cookie');
  if (cookie) headers.set('cookie', cookie);
  const request = new Request(`http://shed.test/media/${file}/${variant}`, { ...init, headers });
  const session = await readSession(services.auth, services.settings, headers);
  const parts = {
    services,
    actor: session.actor,
    requestId: 'test',
    clientAddress: '192.0.2.1',
    headers,
    setCookies: [],
  };
  const locals = { services, requestId: 'test', parts };
  return GET({ params: { file, variant }, request, locals } as unknown as APIContext) as Promise<Response>;
}

const askers = { nobody: null, ...people };
async function statuses(file: string, variant: string): Promise<Record<string, number>> {
  const all = Object.entries(askers).map(async ([name, person]) => {
    const answer = await ask(file, variant, person);
    await answer.body?.cancel();
    return [name, answer.status] as const;
  });
  return Object.fromEntries(await Promise.all(all));
}

const team = (status: number) => ({ owner: status, editor: status, moderator: status });
const others = (status: number) => ({ nobody: status, viewer: status, outsider: status });

async function publish(): Promise<{ episode: string; edition: string }> {
  const [episode, video, edition] = [newId(), newId(), newId()];
  const workshopId = workshop.id;
  await services.db
    .insert(episodes)
    .values({ id: episode, workshopId, buildId: build.id, number: 1, title: 'Drum', state: 'published' });
  await services.db
    .insert(videos)
    .values({ id: video, workshopId, episodeId: episode, fileId: film.id, rateNum: 25, rateDen: 1 });
  await services.db.insert(editions).values({
    id: edition,
    workshopId,
    episodeId: episode,
    number: 1,
    videoId: video,
    publishedAt: new Date(Date.now() - 1000),
  });
  return { episode, edition };
}

describe('Before anything is published', () => {
  test.each(['video', 'poster', 'original'])('%s is for the team alone', async (variant) => {
    const status = variant === 'poster' ? 200 : 302;
    expect(await statuses(film.id, variant)).toEqual({ ...team(status), ...others(404) });
  });

  test('nothing of it is kept by anyone', async () => {
    for (const variant of ['thumb', 'video']) {
      const answer = await ask(film.id, variant, people.owner);
      await answer.body?.cancel();
      expect(answer.headers.get('cache-control')).toBe('private, no-store');
    }
  });

  test('what does not exist answers as what is not shown', async () => {
    const answers = [
      await ask(newId(), 'thumb'),
      await ask('not-an-id', 'thumb', people.owner),
      await ask(film.id, 'large', people.owner),
      await ask(film.id, 'thumb'),
    ];
    const said = await Promise.all(
      answers.map(async (answer) => `${String(answer.status)} ${await answer.text()}`),
    );
    expect(new Set(said)).toEqual(new Set(['404 This file is not here.']));
  });
});

describe('Once an edition is out', () => {
  test('its film and stills are for everyone, the original for the team, until it is withdrawn', async () => {
    const { edition } = await publish();
    const everyone = { ...team(302), ...others(302) };
    expect(await statuses(film.id, 'video')).toEqual(everyone);
    expect(await statuses(film.id, 'poster')).toEqual({ ...team(200), ...others(200) });
    expect(await statuses(film.id, 'original')).toEqual({ ...team(302), ...others(404) });
    expect(await statuses(photo.id, 'thumb')).toEqual({ ...team(200), ...others(404) });

    const setBuild = (visibility: 'private' | 'public') =>
      services.db.update(builds).set({ visibility }).where(eq(builds.id, build.id));
    await setBuild('private');
    expect(await statuses(film.id, 'video')).toEqual({ ...team(302), ...others(404) });
    await setBuild('public');

    const later = new Date(Date.now() + 3_600_000);
    await services.db.update(editions).set({ publishedAt: later }).where(eq(editions.id, edition));
    expect(await statuses(film.id, 'video')).toEqual({ ...team(302), ...others(404) });
    await services.db
      .update(editions)
      .set({ publishedAt: new Date(0), withdrawnAt: new Date() })
      .where(eq(editions.id, edition));
    expect(await statuses(film.id, 'video')).toEqual({ ...team(302), ...others(404) });
    await services.db.update(editions).set({ withdrawnAt: null }).where(eq(editions.id, edition));
    expect(await statuses(film.id, 'video')).toEqual(everyone);
  });

  test('everyone is sent to the same address within the hour, which plays', async () => {
    const [one, other] = [await ask(film.id, 'video'), await ask(film.id, 'video', people.viewer)];
    const location = one.headers.get('location')!;
    expect(other.headers.get('location')).toBe(location);
    expect(new URL(location).searchParams.get('X-Amz-Date')).toMatch(/T\d\d0000Z$/);
    expect(new URL(location).searchParams.get('X-Amz-Expires')).toBe('43200');
    const played = await fetch(location, { headers: { range: 'bytes=4-7' } });
    expect([played.status, played.headers.get('content-type'), await played.text()]).toEqual([
      206,
      'video/mp4',
      'ftyp',
    ]);
  });

  test('HEAD says what a film is without leading elsewhere', async () => {
    const answer = await ask(film.id, 'video', null, { method: 'HEAD' });
    expect(answer.status).toBe(200);
    expect(answer.headers.get('content-type')).toBe('video/mp4');
    expect(Number(answer.headers.get('content-length'))).toBeGreaterThan(1000);
    expect(answer.headers.get('accept-ranges')).toBe('bytes');
  });
});

describe('A picture', () => {
  test('of a public diary entry is for everyone, of a private one for the team', async () => {
    const entryId = newId();
    const workshopId = workshop.id;
    await services.db.insert(diaryEntries).values({
      id: entryId,
      workshopId,
      buildId: build.id,
      day: '2026-03-14',
      text: 'Seats',
      visibility: 'public',
    });
    await services.db.insert(diaryPhotos).values({ workshopId, entryId, fileId: photo.id, position: 1 });
    expect(await statuses(photo.id, 'large')).toEqual({ ...team(200), ...others(200) });
    expect(await statuses(photo.id, 'original')).toEqual({ ...team(302), ...others(404) });
    const shown = await ask(photo.id, 'large');
    await shown.body?.cancel();
    expect(shown.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    await services.db.update(diaryEntries).set({ visibility: 'private' }).where(eq(diaryEntries.id, entryId));
    expect(await statuses(photo.id, 'large')).toEqual({ ...team(200), ...others(404) });
  });

  test('comes whole, in ranges, or not at all when it is known', async () => {
    const whole = await ask(photo.id, 'large', people.editor);
    const bytes = Buffer.from(await whole.arrayBuffer());
    expect(whole.headers.get('content-length')).toBe(String(bytes.length));
    expect(whole.headers.get('x-content-type-options')).toBe('nosniff');
    const part = await ask(photo.id, 'large', people.editor, { headers: { range: 'bytes=10-19' } });
    expect([part.status, part.headers.get('content-range')]).toEqual([
      206,
      `bytes 10-19/${String(bytes.length)}`,
    ]);
    expect(Buffer.from(await part.arrayBuffer())).toEqual(bytes.subarray(10, 20));
    const tail = await ask(photo.id, 'large', people.editor, { headers: { range: 'bytes=-5' } });
    expect(Buffer.from(await tail.arrayBuffer())).toEqual(bytes.subarray(-5));
    const past = await ask(photo.id, 'large', people.editor, { headers: { range: 'bytes=99999999-' } });
    expect([past.status, past.headers.get('content-range')]).toEqual([
      416,
      `bytes */${String(bytes.length)}`,
    ]);
    const known = { headers: { 'if-none-match': whole.headers.get('etag')! } };
    expect((await ask(photo.id, 'large', people.editor, known)).status).toBe(304);
  });

  test('in its original is saved under the name that its owner gave it', async () => {
    const { headers } = await ask(film.id, 'original', people.owner);
    const disposition = new URL(headers.get('location')!).searchParams.get('response-content-disposition');
    expect(disposition).toBe(`attachment; filename="EP4 _cut_.mp4"; filename*=UTF-8''EP4%20%22cut%22.mp4`);
  });
});
