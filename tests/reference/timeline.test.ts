import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { type Edit, lengthOf, sayWarning, type Segment } from '../../src/domain/edit/edit.ts';
import { readEdit } from '../../src/domain/edit/read-edit.ts';
import { formatTimecode } from '../../src/domain/time/timecode.ts';
import { referenceFolder } from './support/reference-folder.ts';

const folder = referenceFolder('timeline');
const skipped = folder === null ? ' (skipped: no reference folder here)' : '';

function read(name: string, fps = 24) {
  const rate = name.endsWith('.otio') ? null : { num: fps, den: 1 };
  return readEdit(readFileSync(join(folder ?? '', name), 'utf8'), { rate });
}

function edit(name: string, fps = 24): Edit {
  const answer = read(name, fps);
  if (!answer.ok) throw new Error(answer.error);
  return answer.value;
}

const frames = (stretch: Segment['source']) => [stretch.in.valueOf(), stretch.out.valueOf()] as const;
const map = (segments: readonly Segment[]) =>
  segments.map(({ source, record }) => [...frames(source), ...frames(record)]);
const lengths = ({ picture }: Edit) => picture.map(({ record }) => lengthOf(record).valueOf());
const seenIn = ({ dissolved }: Edit) => dissolved.map(({ record }) => lengthOf(record).valueOf());

const SCREENING = [31, 50, 28, 115, 101, 161, 170, 136, 257];

/** Expected: tests/test_cmx_3600_adapter.py of OpenTimelineIO/otio-cmx3600-adapter. */
describe.skipIf(folder === null)(`The public edit lists${skipped}`, () => {
  it.each<[string, number, readonly number[]]>([
    ['screening_example.edl', 24, SCREENING],
    ['no_spaces_test.edl', 24, SCREENING],
    ['25fps.edl', 25, [161, 200, 86, 49]],
    ['gap_test.edl', 24, [24, 24, 24]],
    ['dissolve_test.edl', 24, [9, 10, 1]],
    ['dissolve_test_2.edl', 24, [5, 10, 5]],
    ['dissolve_test_3.edl', 24, [61, 30, 46]],
    ['dissolve_test_4.edl', 24, [30, 51, 81, 84, 96, 135]],
  ])('%s at %i has the lengths of its clips', (name, fps, expected) => {
    expect(lengths(edit(name, fps))).toEqual(expected);
    expect(edit(name, fps).warnings).toEqual([]);
  });

  it('map source to record as computed', () => {
    expect(map(edit('screening_example.edl').picture).slice(0, 4)).toEqual([
      [86501, 86532, 0, 31],
      [86557, 86607, 31, 81],
      [86601, 86629, 81, 109],
      [86641, 86756, 109, 224],
    ]);
    expect(edit('screening_example.edl').frames.valueOf()).toBe(1049);
  });

  it('have their marks at record times', () => {
    const marks = edit('screening_example.edl').markers;
    // The first event records from 00:59:53:11.
    const label = (at: number) => formatTimecode(at + 86243, { num: 24, den: 1 });
    expect(marks.map(({ record, colour, name }) => [label(record.valueOf()), colour, name])).toEqual([
      ['01:00:01:14', 'RED', 'ANIM FIX NEEDED'],
      ['01:00:02:14', 'PINK', 'ANIM FIX NEEDED'],
      ['01:00:15:13', 'GREEN', ''],
    ]);
  });

  it('leave gaps where nothing is recorded', () => {
    const gap = edit('gap_test.edl');
    expect(map(gap.picture).map(([, , from, to]) => [from, to])).toEqual([
      [0, 24],
      [40, 64],
      [102, 126],
    ]);
    expect(gap.picture.map(({ clip }) => clip)).toEqual(['shot1', 'shot2', 'shot3']);
    expect(gap.frames.valueOf()).toBe(126);
  });

  it.each([
    ['dissolve_test.edl', [10]],
    ['dissolve_test_2.edl', [10]],
    ['dissolve_test_3.edl', [30]],
    ['dissolve_test_4.edl', [35, 64]],
    ['transition_duration.edl', [26]],
    ['wipe_test.edl', [10]],
  ])('%s shows what goes out for as long as the dissolve takes', (name, expected) => {
    expect(seenIn(edit(name))).toEqual(expected);
  });

  it('say a wipe', () => {
    expect(edit('wipe_test.edl').warnings.map(sayWarning)).toEqual([
      'Line 6: Event 002 comes in by wipe W001 over 10 frames; it is taken as a dissolve.',
    ]);
  });

  it('have held frames and speeds', () => {
    const all = edit('speed_effects.edl');
    expect(formatTimecode(all.frames.valueOf(), { num: 24, den: 1 })).toBe('00:21:03:18');
    const at = (label: number) => all.picture.find(({ record }) => record.in.equals(label));
    expect(at((8 * 60 + 30) * 24)).toMatchObject({ speed: { n: 0n } });
    expect(lengthOf(at((8 * 60 + 30) * 24)!.record).valueOf()).toBe(17);
    const fast = at((11 * 60 + 31) * 24 + 16)!;
    expect([fast.speed.toFraction(), lengthOf(fast.record).valueOf()]).toEqual(['119/60', 36]); // 47.6 / 24
    expect(lengthOf(fast.source).valueOf()).toBe(70);
  });

  it('are refused at a rate that their labels do not have, with the line', () => {
    expect(read('timecode_mismatch.edl', 24)).toEqual({
      ok: false,
      error: 'Line 13: 01:00:01:24 has frames beyond 23.',
    });
  });

  it('keep the record-in where source and record disagree, and say so', () => {
    const mismatch = edit('timecode_mismatch.edl', 25);
    expect(map(mismatch.picture)[3]).toEqual([90000, 90049, 447, 496]); // 00:00:17:22 and 1:24
    expect(sayWarning(mismatch.warnings[0]!)).toMatch(/^Line 13: Event 004 has 49 frames of source for 47/);
  });

  it('are refused where the two lines of a transition bear different numbers', () => {
    expect(read('dissolve_test_fail.edl')).toMatchObject({ ok: false });
  });

  it('may have two sound tracks and no picture', () => {
    const { picture, sound } = edit('multi_audio.edl');
    expect(picture).toEqual([]);
    expect(
      sound.map(({ track, record }) => [
        track,
        formatTimecode(lengthOf(record).valueOf(), { num: 24, den: 1 }),
      ]),
    ).toEqual([
      ['A1', '00:56:55:22'],
      ['A2', '00:56:55:22'],
    ]);
  });
});

const OTIO: readonly [string, number, readonly (readonly number[])[]][] = [
  [
    'simple_cut',
    19,
    [
      [3, 6, 0, 3],
      [2, 8, 3, 9],
      [0, 4, 9, 13],
      [100, 106, 13, 19],
    ],
  ],
  [
    'transition',
    19,
    [
      [3, 6, 0, 3],
      [2, 8, 3, 9],
      [3, 7, 9, 13],
      [100, 106, 13, 19],
    ],
  ],
  // Three tracks over each other: the third, which begins with seven frames of nothing, hides the second.
  [
    'multiple_track',
    19,
    [
      [3, 6, 0, 3],
      [2, 6, 3, 7],
      [100, 109, 7, 16],
      [103, 106, 16, 19],
    ],
  ],
  ['clip_example', 19, [[3, 6, 8, 11]]],
  [
    'transition_test',
    150,
    [
      [0, 50, 0, 50],
      [0, 50, 50, 100],
      [0, 50, 100, 150],
    ],
  ],
];

/** Computed from OpenTimelineIO's tests/sample_data by the rules of its tutorials. */
describe.skipIf(folder === null)(`The public timelines${skipped}`, () => {
  it.each(OTIO)('%s.otio, %i frames, maps source to record', (name, total, expected) => {
    const timeline = edit(`${name}.otio`);
    expect(map(timeline.picture)).toEqual(expected);
    expect(timeline.frames.valueOf()).toBe(total);
  });

  it('are one track when they are flattened', () => {
    const flat = edit('preflattened.otio');
    expect(map(edit('multitrack.otio').picture)).toEqual(map(flat.picture));
    expect(map(flat.picture).slice(0, 4)).toEqual([
      [0, 482, 0, 482],
      [0, 480, 482, 962],
      [159, 395, 962, 1198],
      [0, 640, 1198, 1838],
    ]);
    expect(flat.frames.valueOf()).toBe(3282);
  });

  it('may hold stacks and tracks with ranges and speeds of their own', () => {
    const nested = edit('nested_example.otio');
    expect(lengths(nested)).toEqual([238, 31, 33, 29, 63, 4, 238]);
    expect(nested.picture[5]).toMatchObject({ speed: { n: 0n } });
  });

  it('give the same as the edit list of the same episode', () => {
    expect(map(edit('screening_example.otio').picture)).toEqual(map(edit('screening_example.edl').picture));
  });
});
