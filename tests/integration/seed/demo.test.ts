import { desc, eq } from 'drizzle-orm';
import { beforeAll, describe, expect, test } from 'vitest';
import { editions, episodes, videos } from '../../../src/db/schema/episodes.ts';
import { files, fileVariants } from '../../../src/db/schema/files.ts';
import { listPublicEntries } from '../../../src/features/diary/server/list-public-entries.ts';
import { getCompanion } from '../../../src/features/episodes/server/get-companion.ts';
import { listWaitingAsks } from '../../../src/features/notes/server/list-waiting-asks.ts';
import { seedPress } from '../../../src/seed/press.ts';
import { aWorkshop } from '../../support/people.ts';
import { storageServices } from '../../support/storage.ts';

const services = await storageServices();
const workshop = await aWorkshop(services);

beforeAll(async () => {
  await seedPress({
    ...workshop,
    owner: { ...workshop.owner, services },
    editor: { ...workshop.editor, services },
  });
  // Films are taken in at low priority, which is slow on a busy machine.
}, 300_000);

describe('The demo', () => {
  test('keeps three films as they are, frame for frame, and a clip with the time of its camera', async () => {
    const films = await services.db.select().from(files).where(eq(files.kind, 'video')).orderBy(files.id);
    expect(films.map(({ name, state }) => [name, state])).toEqual([
      ['press-1.mp4', 'ready'],
      ['press-3.mp4', 'ready'],
      ['press-4.mp4', 'ready'],
      ['C0043.MOV', 'ready'],
    ]);
    for (const { probe, rateNum, rateDen, width, height } of films) {
      expect(probe).toMatchObject({ copied: true, videoCodec: 'h264', audioCodec: 'aac' });
      expect([rateNum, rateDen, width, height]).toEqual([25, 1, 1280, 720]);
    }
    expect(films[3]).toMatchObject({
      purpose: 'footage',
      probe: { camera: { wallTime: '2026-11-24T14:22:07' } },
    });
    const variants = await services.db.select().from(fileVariants).where(eq(fileVariants.variant, 'video'));
    expect(variants).toHaveLength(4);
  });

  test('has four episodes out, each with its captions but the one whose video is elsewhere, and a draft', async () => {
    const rows = await services.db
      .select({
        number: episodes.number,
        state: episodes.state,
        address: videos.address,
        captions: editions.captionsId,
      })
      .from(episodes)
      .innerJoin(videos, eq(videos.episodeId, episodes.id))
      .leftJoin(editions, eq(editions.episodeId, episodes.id))
      .orderBy(desc(episodes.number));
    expect(
      rows.map(({ number, state, address, captions }) => [
        number,
        state,
        address !== null,
        captions !== null,
      ]),
    ).toEqual([
      [5, 'draft', false, false],
      [4, 'published', false, true],
      [3, 'published', false, true],
      [2, 'published', true, false],
      [1, 'published', false, true],
    ]);
  });

  test('asks the owner one thing, on the draft', async () => {
    const asks = await listWaitingAsks(workshop.owner, undefined);
    expect(asks).toHaveLength(1);
    expect(JSON.stringify(asks)).toContain('14 or 40');
  });

  test('shows everyone its diary with photos, but not what was kept private', async () => {
    const { items } = await listPublicEntries(workshop.anyone, { build: 'orchard-press' });
    expect(items.length).toBeGreaterThan(5);
    expect(items.flatMap(({ photos }) => photos).length).toBeGreaterThan(3);
    expect(JSON.stringify(items)).not.toContain('C0043');
  });

  test('shows episode 4 with a bench for its length', async () => {
    const companion = await getCompanion(workshop.anyone, { build: 'orchard-press', number: 4 });
    expect(companion.notes.length).toBeGreaterThan(10);
    expect(companion.appearances.length).toBeGreaterThan(10);
    expect(companion.cautions.map(({ topic }) => topic)).toEqual(['rotating', 'pressure']);
  });
});
