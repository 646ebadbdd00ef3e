import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { clips } from '../../../src/db/schema/footage.ts';
import { addStage } from '../../../src/features/builds/server/add-stage.ts';
import { acceptChapters } from '../../../src/features/episodes/server/accept-chapters.ts';
import { getLeaving } from '../../../src/features/episodes/server/get-leaving.ts';
import { listChapters } from '../../../src/features/episodes/server/list-chapters.ts';
import { listProposedChapters } from '../../../src/features/episodes/server/list-proposed-chapters.ts';
import { makeEpisode } from '../../../src/features/episodes/server/make-episode.ts';
import { findDraftEdit } from '../../../src/features/notes/server/load-edits.ts';
import { POST as acceptRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/chapters/accept.ts';
import { GET as leavingRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/leaving.ts';
import { Forbidden, Invalid, NotFound } from '../../../src/server/errors.ts';
import { callRoute } from '../../support/call-route.ts';
import { aKeptVideo, aShownBuild, aShownEpisode, BUILD, noteAt } from '../../support/companion.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { anUncutEpisode, LIST, takeList } from '../../support/edits.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { PUBLIC_URL, testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;
let episode: string;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  const parts = await aShownBuild(workshop.owner);
  const { id } = await getBuild(workshop.owner, { build: BUILD });
  episode = await aShownEpisode(workshop.owner, parts, {
    fileId: await aKeptVideo(workshop.owner, id, { seconds: 60 }),
  });
  await noteAt(workshop.owner, episode, 50, { text: 'It is 412 mm, not 421.', kind: 'correction' });
});

describe('What goes with an episode', () => {
  it('is a text with chapters, cautions, corrections, links and parts, within a length', async () => {
    const leaving = await getLeaving(workshop.moderator, { build: BUILD, episode, length: 5000 });
    expect(leaving?.leftOut).toEqual([]);
    expect(leaving?.text).toContain('Chapters\n0:00 Drum shaft\n0:15 Housings\n0:30 Ports');
    expect(leaving?.text).toContain('Let the pressure down before you open a line.');
    expect(leaving?.text).toContain('0:50 It is 412 mm, not 421.');
    expect(leaving?.text).toMatch(new RegExp(`: ${PUBLIC_URL}/w/${workshop.slug}/press/episodes/\\d+\n`));
    expect(leaving?.text).toContain('117 drum shaft');
    const short = await getLeaving(workshop.moderator, { build: BUILD, episode, length: 200 });
    expect([...(short?.text ?? '')].length).toBeLessThanOrEqual(200);
    expect(short?.leftOut[0]).toBe('Left out: 3 of 3 parts.');
    expect(short?.text).toContain('Let the pressure down');
  });

  it('says what keeps hosts from showing the chapters', async () => {
    const fine = await getLeaving(workshop.owner, { build: BUILD, episode, length: 5000 });
    expect(fine?.faults).toEqual([]);
    const draft = await anUncutEpisode(workshop.owner);
    const none = await getLeaving(workshop.owner, { build: BUILD, episode: draft, length: 5000 });
    expect(none).toMatchObject({
      faults: ['There are no chapters; video hosts show them from three on.'],
      vtt: null,
      json: null,
    });
    const { id } = await makeEpisode(workshop.owner, { build: BUILD, title: 'No video yet' });
    expect(await getLeaving(workshop.owner, { build: BUILD, episode: id, length: 5000 })).toBeNull();
  });

  it('leaves as files, to the team alone', async () => {
    const params = { workshop: workshop.slug, build: BUILD, episode };
    const ask = (as: string, actor: 'moderator' | 'viewer' | 'outsider') =>
      callRoute(services, leavingRoute, { params, query: { as }, actor: workshop.people[actor] });
    const types = { text: 'text/plain', vtt: 'text/vtt', json: 'application/json+chapters' };
    for (const [as, type] of Object.entries(types)) {
      const answer = await ask(as, 'moderator');
      expect([answer.status, answer.headers.get('content-type')]).toEqual([200, `${type}; charset=utf-8`]);
    }
    expect([(await ask('text', 'viewer')).status, (await ask('text', 'outsider')).status]).toEqual([
      404, 404,
    ]);
  });
});

describe('Chapters from stages', () => {
  /** C0043 of one stage, C0044 of another. */
  async function aStagedEpisode(): Promise<string> {
    const staged = await anUncutEpisode(workshop.owner, 25);
    const list = LIST.replace('00:00:10:00 01:00:10:00 01:00:15:00', '00:00:20:00 01:00:10:00 01:00:25:00');
    await takeList(workshop.owner, staged, list);
    const draft = await findDraftEdit(services.db, staged);
    for (const [name, stage] of [
      ['C0043.MP4', 'Drum and bearings'],
      ['C0044.MP4', 'Hydraulics'],
    ] as const) {
      const { id } = await addStage(workshop.owner, { build: BUILD, name: `${stage} ${newId()}`, about: '' });
      const clip = draft?.clipIds.get(name) ?? '';
      await services.db.update(clips).set({ stageId: id }).where(eq(clips.id, clip));
    }
    return staged;
  }
  const proposed = async (of: string) =>
    (await listProposedChapters(workshop.owner, { build: BUILD, episode: of })).items;

  it('are proposed where the stage of the footage changes, and are no more once they are taken', async () => {
    const staged = await aStagedEpisode();
    const items = await proposed(staged);
    expect(items.map(({ start }) => start)).toEqual([0, 10_000]);
    await acceptChapters(workshop.editor, { build: BUILD, episode: staged, start: [10_000] });
    expect((await proposed(staged)).map(({ start }) => start)).toEqual([0]);
    const { items: chapters } = await listChapters(workshop.owner, { build: BUILD, episode: staged });
    expect(chapters.map(({ title, position }) => [title, position.frame])).toEqual([[items[1]?.title, 250]]);
    await expect(
      acceptChapters(workshop.editor, { build: BUILD, episode: staged, start: [10_000] }),
    ).rejects.toThrow(Invalid);
  });

  it('are taken all at once by the form', async () => {
    const staged = await aStagedEpisode();
    const params = { workshop: workshop.slug, build: BUILD, episode: staged };
    const body = { start: ['0', '10000'] };
    const answer = await callRoute(services, acceptRoute, { params, body, actor: workshop.people.editor });
    expect(answer.json).toEqual({ added: 2 });
    expect(await proposed(staged)).toEqual([]);
  });

  it('refuse a moderator, and another workshop finds none', async () => {
    const staged = await aStagedEpisode();
    const input = { build: BUILD, episode: staged, start: [0] };
    await expect(acceptChapters(workshop.moderator, input)).rejects.toThrow(Forbidden);
    await expect(acceptChapters(workshop.outsider, input)).rejects.toThrow(NotFound);
  });
});
