import { beforeAll, describe, expect, it } from 'vitest';
import { changeEpisode } from '../../../src/features/episodes/server/change-episode.ts';
import { getCompanion } from '../../../src/features/episodes/server/get-companion.ts';
import { getDesk } from '../../../src/features/episodes/server/get-desk.ts';
import { getShownCaptions } from '../../../src/features/episodes/server/get-shown-captions.ts';
import { setVideo } from '../../../src/features/episodes/server/set-video.ts';
import { withdrawEpisode } from '../../../src/features/episodes/server/withdraw-episode.ts';
import { getBuild } from '../../../src/features/builds/server/get-build.ts';
import { NotFound } from '../../../src/server/errors.ts';
import {
  aKeptVideo,
  aShownBuild,
  aShownEpisode,
  BUILD,
  captionsOf,
  noteAt,
  publish,
} from '../../support/companion.ts';
import { aWorkshop, type TestWorkshop } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();
let workshop: TestWorkshop;
let parts: Map<string, string>;

beforeAll(async () => {
  workshop = await aWorkshop(services);
  parts = await aShownBuild(workshop.owner);
});

async function aFile(seconds = 60): Promise<string> {
  const build = await getBuild(workshop.owner, { build: BUILD });
  return aKeptVideo(workshop.owner, build.id, { seconds });
}

async function numberOf(episode: string): Promise<number> {
  return (await getDesk(workshop.owner, { build: BUILD, episode })).episode.number;
}

const read = (number: number) => getCompanion(workshop.anyone, { build: BUILD, number });

describe('the page of a published episode', () => {
  it('shows anyone its video, notes, parts, chapters and cautions in their order', async () => {
    const fileId = await aFile();
    const episode = await aShownEpisode(workshop.owner, parts, { fileId });
    const shown = await read(await numberOf(episode));
    expect(shown.video).toMatchObject({ kept: { id: fileId, width: 320 }, elsewhere: null, seconds: 60 });
    expect(shown.notes.map(({ at, kind }) => [at, kind])).toEqual([
      [1, 'size'],
      [10, 'size'],
      [20, 'step'],
      [40, 'caution'],
    ]);
    expect(shown.parts.map(({ number, inPlans }) => [number, inPlans])).toEqual([
      ['117', true],
      ['118', true],
      ['125', false],
    ]);
    expect(shown.chapters.map(({ at, title }) => [at, title])).toEqual([
      [0, 'Drum shaft'],
      [15, 'Housings'],
      [30, 'Ports'],
    ]);
    expect(shown.cautions).toMatchObject([{ topic: 'pressure', at: 40 }]);
    expect(shown.of).toBe(6);
  });

  it('shows nothing that is for the team, or only proposed', async () => {
    const episode = await aShownEpisode(workshop.owner, parts, { fileId: await aFile() });
    const before = (await read(await numberOf(episode))).notes.length;
    await noteAt(workshop.owner, episode, 5, { text: 'Between us.', audience: 'team' });
    await noteAt(workshop.editor, episode, 6, { text: 'It takes 14 t.', kind: 'rating' });
    expect((await read(await numberOf(episode))).notes).toHaveLength(before);
  });

  it('reads a video elsewhere for its frame and its times', async () => {
    const address = 'https://video.example/watch/7';
    const episode = await aShownEpisode(workshop.owner, parts, { address, length: '1:00' });
    const { video } = await read(await numberOf(episode));
    expect(video).toMatchObject({
      kept: null,
      elsewhere: { kind: 'unknown', frameUrl: address, origin: 'https://video.example' },
      seconds: 60,
    });
  });

  it('answers an old number with the current one', async () => {
    const episode = await aShownEpisode(workshop.owner, parts, { fileId: await aFile() });
    const { episode: draft } = await getDesk(workshop.owner, { build: BUILD, episode });
    const { title, about, version, number } = draft;
    await changeEpisode(workshop.owner, { build: BUILD, episode, title, about, version, number: 77 });
    expect((await read(number)).episode.number).toBe(77);
  });

  it('is not there when it is withdrawn, and nobody is told which', async () => {
    const episode = await aShownEpisode(workshop.owner, parts, { fileId: await aFile() });
    const { episode: draft } = await getDesk(workshop.owner, { build: BUILD, episode });
    await withdrawEpisode(workshop.owner, { build: BUILD, episode, version: draft.version });
    await expect(read(draft.number)).rejects.toThrow(NotFound);
    await expect(read(0)).rejects.toThrow(NotFound);
  });
});

describe('a second edition', () => {
  it('replaces the first in one moment, and viewers see nothing in between', async () => {
    const first = await aFile(60);
    const episode = await aShownEpisode(workshop.owner, parts, { fileId: first });
    const number = await numberOf(episode);
    const old = (await read(number)).captions;
    const second = await aFile(45);
    await setVideo(workshop.owner, { build: BUILD, episode, fileId: second, address: null });
    const { id: captions } = await captionsOf(workshop.owner, episode);
    expect((await read(number)).video.kept?.id, 'before it is published').toBe(first);

    const seen = new Set<string>();
    let done = false;
    const watching = (async () => {
      while (!done) {
        const { video, captions: shown } = await read(number);
        seen.add(`${String(video.kept?.id)} ${String(shown?.id)}`);
      }
    })();
    await publish(workshop.owner, episode);
    done = true;
    await watching;
    expect(
      [...seen].filter((pair) => ![`${first} ${String(old?.id)}`, `${second} ${captions}`].includes(pair)),
    ).toEqual([]);
    expect((await read(number)).video).toMatchObject({ kept: { id: second }, seconds: 45 });
  });
});

describe('captions', () => {
  it('are served as long as their edition is on show, and those of no other', async () => {
    const episode = await aShownEpisode(workshop.owner, parts, { fileId: await aFile() });
    const number = await numberOf(episode);
    const first = (await read(number)).captions?.id ?? '';
    const ask = (captions: string) => getShownCaptions(workshop.anyone, { build: BUILD, number, captions });
    expect((await ask(first)).webvtt).toMatch(/^WEBVTT\n[^]*one-one-eight/);
    const { id: second } = await captionsOf(workshop.owner, episode);
    await expect(ask(second)).rejects.toThrow(NotFound);
    await publish(workshop.owner, episode);
    await expect(ask(first)).rejects.toThrow(NotFound);
    expect((await ask(second)).webvtt).toContain('the shaft');
  });
});
