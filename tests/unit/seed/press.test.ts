import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { readCaptions } from '../../../src/domain/captions/read-captions.ts';
import { publishChecks } from '../../../src/domain/episode-checks/publish-checks.ts';
import { findSizes } from '../../../src/domain/lengths/find-sizes.ts';
import { PRESS_DIARY } from '../../../src/seed/press-diary.ts';
import {
  type DemoEpisode,
  type DemoNote,
  PRESS_DRAFT,
  PRESS_EPISODES,
} from '../../../src/seed/press-episodes.ts';
import { NOT_IN_PLANS, PRESS_PARTS, PRESS_STAGES } from '../../../src/seed/press-parts.ts';

const EPISODES: readonly DemoEpisode[] = [...PRESS_EPISODES, PRESS_DRAFT];
const PARTS = new Map(
  PRESS_PARTS.map(([number, name, _kind, quantity, material, size, alias]) => [
    number,
    { name, names: [name, ...(alias === undefined ? [] : [alias])], quantity, says: `${material}, ${size}` },
  ]),
);
const NUMBERS = [...PARTS.keys()];
/** Over the outer corners of the two uprights: 80 + 580 + 80 wide, and as high as they are long. */
const DIAGONAL = Math.hypot(740, 1450);

const cases = EPISODES.map((episode) => [episode.number, episode] as const);
const filmed = cases.filter(([, { video }]) => 'file' in video);

function media(name: string): Buffer {
  return readFileSync(new URL(`../../../src/seed/media/${name}`, import.meta.url));
}

function cuesOf({ video }: DemoEpisode) {
  if (!('captions' in video)) throw new Error('This video has no captions here.');
  const read = readCaptions(media(video.captions));
  if (!read.ok) throw new Error(read.error);
  expect(read.value.warnings).toEqual([]);
  return read.value.cues.map(({ start, end, lines }) => ({
    from: start / 1000,
    to: end / 1000,
    text: lines.join(' ').toLowerCase(),
  }));
}

/** Seconds, from the header box of the film (ISO/IEC 14496-12, section 8.2.2) or the length that was typed. */
function lengthOf({ video }: DemoEpisode): number {
  if ('length' in video) {
    const [minutes = 0, seconds = 0] = video.length.split(':').map(Number);
    return minutes * 60 + seconds;
  }
  const bytes = media(video.file);
  const at = bytes.indexOf('mvhd', 0, 'latin1') + 4;
  expect(bytes[at]).toBe(0);
  return bytes.readUInt32BE(at + 16) / bytes.readUInt32BE(at + 12);
}

function millimetres(text: string): number[] {
  return findSizes(text, { names: NUMBERS }).flatMap(({ values }) => values.map(({ mm }) => Number(mm)));
}

/** Every number that the list says of some parts. */
function listed(numbers: readonly string[]): number[] {
  return numbers.flatMap((number) =>
    [...(PARTS.get(number)?.says ?? '').matchAll(/(?<![\d/])\d+(?:\.\d+)?(?!\/)/g)].map(([found]) =>
      Number(found),
    ),
  );
}

function sizes(standing: DemoNote['standing']): [string, DemoNote][] {
  return EPISODES.flatMap(({ notes }) => notes)
    .filter((note) => note.kind === 'size' && note.standing === standing && note.audience !== 'person')
    .map((note) => [note.text, note]);
}

test("the demo's parts run from 101 to 134 and only what came at the bench is not in the plans", () => {
  expect(NUMBERS).toEqual(Array.from({ length: 34 }, (_none, index) => String(101 + index)));
  expect(NOT_IN_PLANS).toEqual(['125']);
});

test('four episodes are out, one with its video elsewhere, and one is drafted', () => {
  expect(PRESS_EPISODES.map(({ number }) => number)).toEqual([1, 2, 3, 4]);
  expect(PRESS_EPISODES.filter(({ video }) => 'address' in video)).toHaveLength(1);
  expect(Math.max(...PRESS_EPISODES.filter(({ video }) => 'file' in video).map(lengthOf))).toBeGreaterThan(
    60,
  );
  expect(PRESS_DRAFT.notes.filter(({ audience }) => audience === 'person')).toHaveLength(1);
});

test.each(cases)('episode %i names only parts of the list', (_number, { notes, onBench }) => {
  const named = [...notes.flatMap(({ parts }) => parts), ...onBench.map(([part]) => part)];
  expect(named.filter((part) => !PARTS.has(part))).toEqual([]);
});

test.each(cases)('everything of episode %i lies in its video, in order', (_number, episode) => {
  const length = lengthOf(episode);
  const times = [
    ...episode.notes.map(({ at }) => at),
    ...episode.chapters.map(([at]) => at),
    ...episode.onBench.flatMap(([, from, to]) => [from, to]),
  ];
  expect(times.filter((at) => at < 0 || at > length)).toEqual([]);
  expect(episode.onBench.filter(([, from, to]) => to <= from)).toEqual([]);
  const ats = episode.notes.map(({ at }) => at);
  expect(ats).toEqual([...ats].sort((a, b) => a - b));
});

test.each(PRESS_EPISODES.map((episode) => [episode.number, episode] as const))(
  'episode %i passes the checks before publishing, but for the part that is not in the plans',
  (_number, episode) => {
    const rate = { num: 1000, den: 1 };
    const open = publishChecks({
      title: episode.title,
      video: { state: 'ready', lengthFrames: Math.floor(lengthOf(episode) * 1000) },
      rate,
      chapters: episode.chapters.map(([at, title]) => ({ start: at * 1000, title })),
      edit: null,
      captionCount: 'captions' in episode.video ? cuesOf(episode).length : 1,
      notes: episode.notes.map((note, index) => ({
        id: String(index),
        frame: note.at * 1000,
        endFrame: null,
        text: note.text,
        audience: note.audience ?? 'viewers',
        proposed: false,
        topic: note.topic ?? null,
        partIds: note.parts,
        waitsFor: null,
      })),
      parts: NUMBERS.map((number) => ({
        id: number,
        number,
        name: PARTS.get(number)?.name ?? '',
        inPlans: !NOT_IN_PLANS.includes(number),
      })),
      revision: null,
    }).filter(({ holds }) => !holds);
    expect(open.map(({ id }) => id).filter((id) => id !== 'parts-in-plans')).toEqual([]);
  },
);

describe('Captions', () => {
  test.each(filmed)('of episode %i follow one another and end with the video', (_number, episode) => {
    const cues = cuesOf(episode);
    expect(cues.filter(({ from }, index) => from < (cues[index - 1]?.to ?? 0))).toEqual([]);
    const last = cues.at(-1)?.to ?? 0;
    expect(lengthOf(episode) - last).toBeGreaterThan(0);
    expect(lengthOf(episode) - last).toBeLessThan(4);
  });

  test.each(filmed)('of episode %i speak when a note stands, and of its parts', (_number, episode) => {
    const cues = cuesOf(episode);
    const silent = episode.notes.filter(
      ({ at }) => !cues.some(({ from, to }) => at >= from - 0.2 && at < to),
    );
    expect(silent.map(({ at, text }) => [at, text])).toEqual([]);
    const unspoken = episode.notes.flatMap(({ at, parts }) => {
      const heard = cues
        .filter(({ from, to }) => to > at - 20 && from < at + 4)
        .map(({ text }) => text)
        .join(' ')
        .replaceAll('one two three', '123');
      return parts
        .filter((part) => ![part, ...(PARTS.get(part)?.names ?? [])].some((name) => heard.includes(name)))
        .map((part) => [at, part]);
    });
    expect(unspoken).toEqual([]);
  });

  test.each(filmed)('of episode %i name only numbers of parts that are in the list', (_number, episode) => {
    const spoken = cuesOf(episode).flatMap(({ text }) => [
      ...text.matchAll(/(?:^|[a-z]|that is|lines), (1[0-9]{2})(?=[.,:]|$)/g),
    ]);
    expect(spoken.map(([, number]) => number).filter((number) => !PARTS.has(number ?? ''))).toEqual([]);
  });
});

describe('Sizes', () => {
  test.each(sizes('plan'))('of the plan are those of the parts list: %s', (text, { parts }) => {
    const found = millimetres(text);
    expect(found.length).toBeGreaterThan(0);
    expect(found.filter((size) => !listed(parts).includes(size))).toEqual([]);
  });

  test.each(sizes('as-made'))('as made are within a hundredth of what was planned: %s', (text, { parts }) => {
    const planned = [...listed(parts), DIAGONAL];
    // "Give or take 1 mm" is a tolerance, not a size.
    const found = millimetres(text).filter((size) => size > 1);
    expect(found.length).toBeGreaterThan(0);
    expect(found.filter((size) => planned.every((plan) => Math.abs(size - plan) > plan / 100))).toEqual([]);
  });

  test.each(sizes('as-said'))('as said are those of the parts list: %s', (text, { parts }) => {
    expect(millimetres(text).filter((size) => !listed(parts).includes(size))).toEqual([]);
  });

  test('in the steps and the ask of episode 4 are those of the parts list', () => {
    const four = EPISODES.find(({ number }) => number === 4)?.notes ?? [];
    const said = four.filter(({ kind }) => kind === 'step' || kind === 'ask');
    const found = said.flatMap(({ text, parts }) => millimetres(text).map((size) => [size, parts] as const));
    expect(found.map(([size]) => size)).toEqual([412, 38.1]);
    expect(found.filter(([size, parts]) => !listed(parts).includes(size))).toEqual([]);
  });
});

describe('The machine', () => {
  const all = EPISODES.flatMap(({ notes }) => notes.map(({ text }) => text)).join('\n');

  test('pushes what the first episode says: pressure over the bore', () => {
    const [bore = 0, rod = 0] = listed(['124']);
    const [, bar = 0] = /set at (\d+) bar/.exec(PARTS.get('127')?.says ?? '')?.map(Number) ?? [];
    // 1 bar = 0.1 N/mm².
    const kilonewtons = ((Math.PI / 4) * bore ** 2 * bar * 0.1) / 1000;
    expect(rod).toBeLessThan(bore);
    expect(all).toContain(`pushes ${String(Math.round(kilonewtons))} kN at ${String(bar)} bar`);
    expect(all).toContain(`Relief valve set at ${String(bar)} bar.`);
    expect(Math.round(kilonewtons / 9.80665)).toBe(9);
    // A gauge is read in the middle of its scale.
    const [, gauge = 0] = listed(['129']);
    expect(bar / gauge).toBeGreaterThan(0.25);
    expect(bar / gauge).toBeLessThan(0.75);
  });

  test('has bearings that fit its shaft, and seats within 35 k6', () => {
    expect(listed(['119'])).toEqual([6207, 35, 72, 17]);
    const [bar = 0] = listed(['117']);
    expect(bar).toBeGreaterThan(35);
    // ISO 286-2: k6 over 30 to 50 mm is +18 and +2 micrometres.
    expect(all).toContain('35 k6: 35.002 to 35.018 mm');
    const [wide = 0] = listed(['118']);
    expect(wide).toBeGreaterThan(72 + 20);
  });

  test('fits together: drum, blades and comb, slats in a rack, racks and tray between the uprights', () => {
    const [drumAcross = 0, drumLong = 0] = listed(['120']);
    const [, bladeLong = 0] = listed(['121']);
    const [, comb = 0] = listed(['115']);
    expect([drumAcross, drumLong]).toEqual([160, 196]);
    expect(bladeLong).toBeLessThan(drumLong);
    expect(comb).toBeGreaterThan(drumLong);
    const [slatWide = 0] = listed(['108']);
    const [rack = 0, , gap = 0] = listed(['109']);
    const perRack = (PARTS.get('108')?.quantity ?? 0) / (PARTS.get('109')?.quantity ?? 1);
    expect(Math.abs(perRack * slatWide + (perRack - 1) * gap - rack)).toBeLessThanOrEqual(2);
    const between = 740 - 2 * 80;
    const [, , tray = 0] = listed(['131']);
    const [, , guide = 0] = listed(['107']);
    expect([rack, tray, guide].filter((wide) => wide >= between)).toEqual([]);
    expect(Math.round(DIAGONAL)).toBe(1628);
  });

  test('turns its drum as fast as the pulleys make it', () => {
    const [pulley = 0] = listed(['122']);
    const turns = (listed(['130']).at(-1) ?? 0) * (80 / pulley);
    expect(all).toContain(`About ${String(turns)} rpm at the drum`);
    expect(cuesOf(PRESS_DRAFT).some(({ text }) => text.includes(`${String(turns)} turns at the drum`))).toBe(
      true,
    );
  });

  test('is told right where the film is not: the correction stands where the slip is heard', () => {
    const [four] = PRESS_EPISODES.filter(({ number }) => number === 4);
    const slip = four && cuesOf(four).find(({ text }) => text.includes('sixty millimetres'));
    const correction = four?.notes.find(({ kind }) => kind === 'correction');
    expect(Math.abs((correction?.at ?? 0) - (slip?.from ?? -10))).toBeLessThan(0.5);
    expect(millimetres(correction?.text ?? '')).toEqual([160]);
    const [, , stroke = 0] = listed(['124']);
    expect(stroke).toBeGreaterThan(160);
  });
});

test('the diary follows the calendar, its stages are those of the build, and its photos are there and described', () => {
  const days = PRESS_DIARY.map(({ day }) => day);
  expect(days).toEqual([...days].sort());
  const stages = PRESS_STAGES.map(([name]) => name);
  expect(PRESS_DIARY.filter(({ stage }) => !stages.includes(stage))).toEqual([]);
  const photos = PRESS_DIARY.flatMap(({ photos: shown = [] }) => shown);
  expect(photos.length).toBeGreaterThan(2);
  for (const { file, description } of photos) {
    expect(media(file).length).toBeGreaterThan(10_000);
    expect(description).toMatch(/^Drawing of .{20,}\.$/);
  }
});
