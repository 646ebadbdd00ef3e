import { beforeAll, describe, expect, it } from 'vitest';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { getCaptionMove } from '../../../src/features/episodes/server/get-caption-move.ts';
import { getEdits } from '../../../src/features/episodes/server/get-edits.ts';
import { moveByCaptions } from '../../../src/features/episodes/server/move-by-captions.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { isInEdit } from '../../../src/features/notes/note.ts';
import { listNotes } from '../../../src/features/notes/server/list-notes.ts';
import { POST as byCaptionsRoute } from '../../../src/pages/api/workshops/[workshop]/builds/[build]/episodes/[episode]/edits/by-captions.ts';
import { Forbidden, NotFound } from '../../../src/server/errors.ts';
import { callRoute } from '../../support/call-route.ts';
import { aKeptVideo, aShownBuild, BUILD, captionsOf, noteAt } from '../../support/companion.ts';
import { anUncutEpisode, takeList } from '../../support/edits.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  await aShownBuild(workshop.owner);
});

const INTRO = 'welcome back to the orchard press';
const SHAFT = 'we turn the drum shaft between dead centres';
const WIRE = 'the brush goes round and round for a while';
const BEARING = 'the bearing goes on last of all today';

/** Captions of ten seconds each. */
function vtt(...lines: string[]): string {
  const at = (index: number) => `00:00:${String(index * 10).padStart(2, '0')}.000`;
  const cues = lines.map((line, index) => `${at(index)} --> ${at(index + 1)}\n${line}\n`);
  return `WEBVTT\n\n${cues.join('\n')}`;
}

async function newVersion(episode: string, seconds: number, webvtt: string): Promise<void> {
  const { id: buildId } = await getBuild(workshop.owner, { build: BUILD });
  const fileId = await aKeptVideo(workshop.owner, buildId, { seconds });
  await setVideo(workshop.owner, { build: BUILD, episode, fileId, address: null });
  await captionsOf(workshop.owner, episode, webvtt);
}

/** Noted in three passages of the first version; the second has an intro, and no wire brush. */
async function aRecutEpisode(): Promise<string> {
  const episode = await anUncutEpisode(workshop.owner, 30);
  await captionsOf(workshop.owner, episode, vtt(SHAFT, WIRE, BEARING));
  await noteAt(workshop.owner, episode, 4, { text: 'The shaft.' });
  await noteAt(workshop.owner, episode, 15, { text: 'The brush.' });
  await noteAt(workshop.owner, episode, 25, { text: 'The bearing.' });
  await newVersion(episode, 30, vtt(INTRO, SHAFT, BEARING));
  return episode;
}

async function secondsOfNotes(episode: string) {
  const { items } = await listNotes(workshop.owner, { build: BUILD, episode });
  return Object.fromEntries(
    items.map((note) => {
      const { frame, rate } = note.position;
      return [note.text, isInEdit(note) ? (frame * rate.den) / rate.num : null];
    }),
  );
}

describe('Moving notes by the captions of two versions', () => {
  it('reports what moves and what was not found, and keeps nothing of it', async () => {
    const episode = await aRecutEpisode();
    const offer = await getCaptionMove(workshop.editor, { build: BUILD, episode, look: false });
    expect(offer).toMatchObject({ captions: 2, look: null });
    const seen = await getCaptionMove(workshop.editor, { build: BUILD, episode, look: true });
    expect(seen?.look).toMatchObject({
      found: 20_000,
      length: 30_000,
      unaligned: [{ in: 10_000, out: 20_000 }],
      report: {
        stays: 1,
        moves: { count: 1, least: 10, most: 10 },
        lost: [{ what: 'note', text: 'The brush.' }],
      },
    });
    const { versions } = await getEdits(workshop.editor, { build: BUILD, episode });
    expect(versions).toEqual([]);
  });

  it('takes the move as an edit on the version before, whose notes go with their words', async () => {
    const episode = await aRecutEpisode();
    await moveByCaptions(workshop.editor, { build: BUILD, episode, captions: 2 });
    const { versions, shown } = await getEdits(workshop.owner, { build: BUILD, episode });
    expect(versions.map(({ number, source }) => [number, source])).toEqual([
      [2, 'captions'],
      [1, 'captions'],
    ]);
    expect(shown?.edit.warnings).toHaveLength(1);
    expect(await secondsOfNotes(episode)).toEqual({
      'The shaft.': 14,
      'The brush.': null,
      'The bearing.': 25,
    });
    expect(await getCaptionMove(workshop.editor, { build: BUILD, episode, look: false })).toBeNull();
  });

  it('moves them again with the version after', async () => {
    const episode = await aRecutEpisode();
    await moveByCaptions(workshop.editor, { build: BUILD, episode, captions: 2 });
    await newVersion(episode, 20, vtt(BEARING, SHAFT));
    const seen = await getCaptionMove(workshop.editor, { build: BUILD, episode, look: true });
    expect(seen?.look?.report).toMatchObject({ stays: 1, moves: { count: 1, least: 20 }, lost: [] });
    await moveByCaptions(workshop.editor, { build: BUILD, episode, captions: 3 });
    expect(await secondsOfNotes(episode)).toEqual({
      'The shaft.': 14,
      'The brush.': null,
      'The bearing.': 5,
    });
  });

  it('moves nothing where no words are shared, and says so', async () => {
    const episode = await anUncutEpisode(workshop.owner, 10);
    await captionsOf(workshop.owner, episode, vtt(SHAFT));
    await newVersion(episode, 10, vtt(INTRO));
    const params = { workshop: workshop.slug, build: BUILD, episode };
    const form = { captions: '2' };
    const answer = await callRoute(services, byCaptionsRoute, {
      params,
      form,
      actor: workshop.people.editor,
    });
    expect(answer.page?.form.errors['']).toContain('no words in common');
  });

  it('moves nothing when other captions came in after the look', async () => {
    const episode = await aRecutEpisode();
    await captionsOf(workshop.owner, episode, vtt(SHAFT));
    const late = moveByCaptions(workshop.editor, { build: BUILD, episode, captions: 2 });
    await expect(late).rejects.toMatchObject({
      fields: { '': expect.stringContaining('meanwhile') as string },
    });
  });

  it('is not offered where an edit list says what moved', async () => {
    const episode = await aRecutEpisode();
    await takeList(workshop.owner, episode, undefined, {
      'match-0': 'named',
      'match-1': 'named',
      'match-2': 'named',
    });
    expect(await getCaptionMove(workshop.editor, { build: BUILD, episode, look: true })).toBeNull();
  });

  it('refuses a moderator, and does not find another workshop’s episode', async () => {
    const episode = await aRecutEpisode();
    const input = { build: BUILD, episode, captions: 2 };
    await expect(moveByCaptions(workshop.moderator, input)).rejects.toThrow(Forbidden);
    await expect(moveByCaptions(workshop.outsider, input)).rejects.toThrow(NotFound);
    await expect(getCaptionMove(workshop.outsider, { ...input, look: true })).rejects.toThrow(NotFound);
  });
});
