import { and, asc, eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { newId } from '../../../src/db/columns.ts';
import { editions, edits } from '../../../src/db/schema/episodes.ts';
import { clips } from '../../../src/db/schema/footage.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { MATCHES } from '../../../src/features/episodes/edit.ts';
import { listPublishChecks } from '../../../src/features/episodes/server/list-publish-checks.ts';
import { getEdits } from '../../../src/features/episodes/server/get-edits.ts';
import { takeEditAgain } from '../../../src/features/episodes/server/take-edit-again.ts';
import { findDraftEdit, findEditById } from '../../../src/features/notes/server/load-edits.ts';
import { previewEdit } from '../../../src/features/episodes/server/preview-edit.ts';
import { POST as previewRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/edits/preview.ts';
import { POST as takeRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/edits/index.ts';
import { Forbidden, NotFound } from '../../../src/server/errors.ts';
import { callRoute } from '../../support/call-route.ts';
import { aShownBuild, BUILD, publish } from '../../support/companion.ts';
import { anUncutEpisode, LIST, NEXT_LIST, readEditOf, takeList } from '../../support/edits.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;
let buildId: string;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  await aShownBuild(workshop.owner);
  buildId = (await getBuild(workshop.owner, { build: BUILD })).id;
});

const look = (episode: string, fields: Readonly<Record<string, unknown>>) =>
  previewEdit(workshop.editor, { ...readEditOf(fields), build: BUILD, episode });

async function aClip(name: string, fields: Partial<typeof clips.$inferInsert> = {}): Promise<string> {
  const id = newId();
  await services.db
    .insert(clips)
    .values({ id, workshopId: workshop.id, buildId, name, rateNum: 25, rateDen: 1, ...fields });
  return id;
}

describe('Looking at an edit', () => {
  it('suggests the rate of the video for a list, and says why', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const view = await look(episode, { text: LIST });
    expect(view).toMatchObject({ rate: '25', source: 'list', lengthsApart: null, seen: 0, compared: null });
    expect(view.rateReason).toBe(
      'A list does not say its rate. The video runs at 25 frames a second, and every label of the list exists at that rate.',
    );
    expect(view.edit?.picture).toHaveLength(2);
    expect(await services.db.select().from(edits).where(eq(edits.episodeId, episode))).toEqual([]);
  });

  it('asks for the rate of a list that has a label which the video’s rate does not', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const view = await look(episode, { text: LIST.replace('00:00:41:00', '00:00:40:28') });
    expect(view).toMatchObject({ rate: '', edit: null, error: null });
    expect(view.rateReason).toMatch(/some of its labels do not exist at the video’s, 25\. .* 29\.97, 30,/);
  });

  it('says in time and frames when the edit is not as long as the video', async () => {
    const episode = await anUncutEpisode(workshop.owner, 16);
    expect((await look(episode, { text: LIST })).lengthsApart).toBe(
      'The edit is 00:00:15:00 (375 frames at 25) long, the video 00:00:16:00 (400 frames at 25): the edit is 25 frames shorter.',
    );
  });

  it('proposes the footage of a name, and lets the person choose between two', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const [one, other] = [await aClip('C0901.MP4'), await aClip('c0901.mp4')];
    const single = await aClip('C0902.MP4');
    const text = LIST.replaceAll('C0043', 'C0901').replaceAll('C0044', 'C0902');
    const { names } = await look(episode, { text });
    expect(names).toMatchObject([
      { name: 'C0901.MP4', match: '', proposed: [one, other] },
      { name: 'C0902.MP4', match: single },
    ]);
    await expect(takeList(workshop.editor, episode, text)).rejects.toMatchObject({
      fields: { 'match-0': 'Several clips fit “C0901.MP4”: choose one.' },
    });
  });

  it('gives the text back so that a form can carry it, every line end as it was', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const text = LIST.replace('\n', '\r\n');
    const { packed } = await look(episode, { text });
    const { id } = await takeList(workshop.editor, episode, '', { packed });
    const [kept] = await services.db.select().from(edits).where(eq(edits.id, id));
    expect(kept?.sourceText).toBe(text);
  });

  it('reads clips at a rate of their own', async () => {
    const episode = await anUncutEpisode(workshop.owner, 20);
    const text = LIST.replace('00:00:31:00 00:00:41:00', '00:00:31:00 00:00:41:49');
    expect((await look(episode, { text, rate: '25' })).error).toMatch(/^Line 4: /);
    const view = await look(episode, { text: LIST, rate: '25', 'clip-rate-0': '50' });
    expect(view.edit?.picture[0]?.clipRate).toEqual({ num: 50, den: 1 });
    expect(view.names[0]?.clipRate).toBe('50');
  });
});

describe('Taking an edit', () => {
  it('keeps it as the next version with what its names stand for, and makes clips of names without footage', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const known = await aClip('C0043.MP4');
    const { number } = await takeList(workshop.editor, episode, LIST, { 'match-0': known });
    expect(number).toBe(1);
    const draft = await findDraftEdit(services.db, episode);
    const made = draft?.clipIds.get('C0044.MP4') ?? '';
    const [clip] = await services.db.select().from(clips).where(eq(clips.id, made));
    expect(clip).toMatchObject({
      name: 'C0044.MP4',
      fileId: null,
      frames: null,
      startLabel: null,
      cameraId: null,
    });
    expect(draft?.clipIds.get('C0043.MP4')).toBe(known);
    expect(draft?.edit.picture.map(({ clip: name }) => name)).toEqual(['C0043.MP4', 'C0044.MP4']);
  });

  it('remembers what was said of a name in the edit before, none of the footage too', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const [odd] = [await aClip('GX010007.MP4')];
    const text = LIST.replaceAll('C0043', 'INTRO').replaceAll('C0044', 'HANDHELD');
    await takeList(workshop.editor, episode, text, { 'match-0': MATCHES.none, 'match-1': odd });
    const { names } = await look(episode, { text });
    expect(names).toMatchObject([
      { match: MATCHES.none, earlier: true },
      { match: odd, earlier: true },
    ]);
  });

  it('says what moved, was trimmed, is new and was dropped against the version before', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    await takeList(workshop.editor, episode);
    const { compared, seen } = await look(episode, { text: NEXT_LIST, rate: '25' });
    expect(seen).toBe(1);
    expect(compared?.map(({ change, before, after }) => [change, (after ?? before)?.clip])).toEqual([
      ['new', 'C0050.MP4'],
      ['trimmed', 'C0043.MP4'],
      ['dropped', 'C0044.MP4'],
    ]);
  });

  it('is refused when somebody took another since it was looked at', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    await takeList(workshop.editor, episode, LIST, { seen: '0' });
    await expect(takeList(workshop.owner, episode, NEXT_LIST, { seen: '0' })).rejects.toMatchObject({
      fields: { '': expect.stringContaining('Another edit was taken meanwhile.') as string },
    });
  });

  it('gives two people who take one at once versions of their own', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const numbers = await Promise.allSettled([
      takeList(workshop.editor, episode),
      takeList(workshop.owner, episode, NEXT_LIST),
    ]);
    const kept = await services.db
      .select({ number: edits.number })
      .from(edits)
      .where(eq(edits.episodeId, episode))
      .orderBy(asc(edits.number));
    expect(kept.map(({ number }) => number)).toEqual(
      numbers.filter(({ status }) => status === 'fulfilled').map((_, index) => index + 1),
    );
    expect(kept.length).toBeGreaterThan(0);
  });

  it('refuses a clip of another build, and one that is none', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    for (const match of [newId(), 'C0043']) {
      await expect(takeList(workshop.editor, episode, LIST, { 'match-0': match })).rejects.toMatchObject({
        fields: { 'match-0': 'Choose a clip of this build for “C0043.MP4”.' },
      });
    }
  });

  it('refuses a moderator, who may not', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    await expect(takeList(workshop.moderator, episode)).rejects.toThrow(Forbidden);
    await expect(
      previewEdit(workshop.moderator, { ...readEditOf({ text: LIST }), build: BUILD, episode }),
    ).rejects.toThrow(Forbidden);
  });

  it('does not find another workshop’s episode', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    await expect(takeList(workshop.outsider, episode)).rejects.toThrow(NotFound);
    const params = { workshop: workshop.otherSlug, build: BUILD, episode };
    for (const route of [takeRoute, previewRoute]) {
      const answer = await callRoute(services, route, {
        params,
        actor: workshop.people.outsider,
        body: { text: LIST, rate: '25' },
      });
      expect(answer.status).toBe(404);
    }
  });
});

describe('Going back', () => {
  const again = (context: TestWorkshop['owner'], episode: string, edit: string) =>
    takeEditAgain(context, { build: BUILD, episode, edit });

  it('takes an old version as a new one, with its text and its matches', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const first = await takeList(workshop.editor, episode);
    await takeList(workshop.editor, episode, NEXT_LIST);
    const { number } = await again(workshop.owner, episode, first.id);
    const { versions, shown } = await getEdits(workshop.moderator, { build: BUILD, episode });
    expect(versions.map((one) => [one.number, one.sourceName, one.takenBy])).toEqual([
      [number, 'press-4.edl', workshop.people.owner.name],
      [2, 'press-4.edl', workshop.people.editor.name],
      [1, 'press-4.edl', workshop.people.editor.name],
    ]);
    expect(shown?.edit.picture.map(({ clip }) => clip)).toEqual(['C0043.MP4', 'C0044.MP4']);
    expect(shown?.clipIds).toEqual((await findEditById(services.db, first.id))?.clipIds);
    expect(shown?.compared?.map(({ change }) => change)).toEqual(['trimmed', 'new', 'dropped']);
    const old = await getEdits(workshop.owner, { build: BUILD, episode, version: 1 });
    expect(old.shown).toMatchObject({ number: 1, compared: null });
    await expect(getEdits(workshop.owner, { build: BUILD, episode, version: 9 })).rejects.toThrow(NotFound);
  });

  it('refuses a moderator, and finds no version of another episode or workshop', async () => {
    const [episode, other] = [await anUncutEpisode(workshop.owner), await anUncutEpisode(workshop.owner)];
    const { id } = await takeList(workshop.owner, episode);
    await expect(again(workshop.moderator, episode, id)).rejects.toThrow(Forbidden);
    await expect(again(workshop.owner, other, id)).rejects.toThrow(NotFound);
    await expect(again(workshop.outsider, episode, id)).rejects.toThrow(NotFound);
  });
});

describe('An edition', () => {
  it('keeps the edit that the draft had, whatever is taken later', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const first = await takeList(workshop.owner, episode);
    await publish(workshop.owner, episode);
    await takeList(workshop.owner, episode, NEXT_LIST);
    const shown = and(eq(editions.episodeId, episode), eq(editions.number, 1));
    const [edition] = await services.db.select().from(editions).where(shown);
    expect(edition?.editId).toBe(first.id);
  });

  it('is checked for an edit of another length', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const lengths = async () =>
      (await listPublishChecks(workshop.owner, { build: BUILD, episode })).items.find(
        ({ id }) => id === 'edit',
      );
    expect(await lengths()).toBeUndefined();
    await takeList(workshop.owner, episode);
    expect(await lengths()).toMatchObject({ holds: true, level: 'should' });
    await takeList(workshop.owner, episode, NEXT_LIST);
    expect(await lengths()).toMatchObject({
      holds: false,
      sentence:
        'The edit is 00:00:10:00 (250 frames at 25) long, the video 00:00:15:00 (375 frames at 25): the edit is 125 frames shorter.',
    });
  });
});

describe('The form', () => {
  it('shows the look in its page, then takes it and leads to the version', async () => {
    const episode = await anUncutEpisode(workshop.owner);
    const params = { workshop: workshop.slug, build: BUILD, episode };
    const actor = workshop.people.editor;
    const looked = await callRoute(services, previewRoute, { params, actor, form: { text: LIST } });
    expect(looked.page?.path).toBe(`/bench/${workshop.slug}/${BUILD}/episodes/${episode}/edit`);
    const { packed, rate } = looked.page?.form.result as { packed: string; rate: string };
    const taken = await callRoute(services, takeRoute, {
      params,
      actor,
      form: { packed, rate, name: 'a.edl', seen: '0' },
    });
    expect(taken).toMatchObject({
      status: 303,
      location: `/bench/${workshop.slug}/${BUILD}/episodes/${episode}/edit?version=1`,
    });
  });

  it.each([
    ['nothing', {}, 'Choose the edit list or timeline that the editing program exported.'],
    [
      'a packed text that was cut',
      { packed: 'abc' },
      'The edit did not come back whole. Choose the file again.',
    ],
  ])('says at the file what is wrong with %s', async (_what, form, sentence) => {
    const episode = await anUncutEpisode(workshop.owner);
    const params = { workshop: workshop.slug, build: BUILD, episode };
    const answer = await callRoute(services, previewRoute, { params, actor: workshop.people.editor, form });
    expect(answer.page?.form.errors).toEqual({ file: sentence });
  });
});
