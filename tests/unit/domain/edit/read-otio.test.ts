import { describe, expect, it } from 'vitest';
import { type Edit, sayWarning, type Segment } from '../../../../src/domain/edit/edit.ts';
import { type OtioObject } from '../../../../src/domain/edit/otio-objects.ts';
import { readOtio } from '../../../../src/domain/edit/read-otio.ts';
import { type Rate } from '../../../../src/domain/time/rate.ts';

const time = (value: unknown, rate: unknown = 25) => ({ OTIO_SCHEMA: 'RationalTime.1', value, rate });
const range = (start: unknown, duration: unknown, rate: unknown = 25) => ({
  OTIO_SCHEMA: 'TimeRange.1',
  start_time: time(start, rate),
  duration: time(duration, rate),
});
const clip = (name: string, start: number, duration: number, more: OtioObject = {}) => ({
  OTIO_SCHEMA: 'Clip.2',
  name,
  source_range: range(start, duration),
  ...more,
});
const gap = (duration: number) => ({ OTIO_SCHEMA: 'Gap.1', source_range: range(0, duration) });
const warp = (time_scalar: number) => ({ effects: [{ OTIO_SCHEMA: 'LinearTimeWarp.1', time_scalar }] });
const dissolve = (before: number, after: number) => ({
  OTIO_SCHEMA: 'Transition.1',
  transition_type: 'SMPTE_Dissolve',
  in_offset: time(before),
  out_offset: time(after),
});
const track = (children: readonly unknown[], more: OtioObject = {}) => ({
  OTIO_SCHEMA: 'Track.1',
  kind: 'Video',
  children,
  ...more,
});
const stack = (children: readonly unknown[], more: OtioObject = {}) => ({
  OTIO_SCHEMA: 'Stack.1',
  children,
  ...more,
});
const timeline = (...tracks: readonly unknown[]) =>
  JSON.stringify({ OTIO_SCHEMA: 'Timeline.1', name: 'Press', tracks: stack(tracks) });

function edit(text: string, rate: Rate | null = null, clipRates?: ReadonlyMap<string, Rate>): Edit {
  const read = readOtio(text, { rate, ...(clipRates === undefined ? {} : { clipRates }) });
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

const map = (segments: readonly Segment[]) =>
  segments.map(({ clip: name, source, record, speed }) => [
    name,
    ...[source.in, source.out, record.in, record.out].map((at) => at.valueOf()),
    speed.toFraction(),
  ]);

describe('A timeline', () => {
  it('takes all of the media where a clip has no range, and its name from the file', () => {
    const media = {
      OTIO_SCHEMA: 'ExternalReference.1',
      target_url: 'file:///shed/card%201/C0043.MP4',
      available_range: range(750, 50),
    };
    const whole = {
      OTIO_SCHEMA: 'Clip.2',
      name: '',
      source_range: null,
      media_references: { DEFAULT_MEDIA: media },
      active_media_reference_key: 'DEFAULT_MEDIA',
    };
    expect(map(edit(timeline(track([whole]))).picture)).toEqual([['C0043.MP4', 750, 800, 0, 50, '1']]);
  });

  it('plays faster, slower, backwards and not at all without changing its length', () => {
    const clips = [clip('A', 0, 50, warp(2)), clip('B', 0, 50, warp(0.5)), clip('C', 100, 50, warp(-1))];
    const held = clip('D', 7, 50, { effects: [{ OTIO_SCHEMA: 'FreezeFrame.1', time_scalar: 0 }] });
    const read = edit(timeline(track([...clips, held])));
    expect(map(read.picture)).toEqual([
      ['A', 0, 100, 0, 50, '2'],
      ['B', 0, 25, 50, 100, '1/2'],
      ['C', 100, 150, 100, 150, '-1'],
      ['D', 7, 8, 150, 200, '0'],
    ]);
    expect(read.warnings.map(sayWarning)).toEqual(['“C” plays backwards.']);
  });

  it('plays a stack at the speed of the stack, on top of that of its clips', () => {
    const inside = track([clip('A', 0, 50, warp(2)), clip('B', 0, 50)]);
    const outside = stack([inside], { source_range: range(25, 25), ...warp(2) });
    expect(map(edit(timeline(track([gap(10), outside]))).picture)).toEqual([
      ['A', 50, 100, 10, 22.5, '4'],
      ['B', 0, 25, 22.5, 35, '2'],
    ]);
  });

  it('shows both clips of a dissolve, which takes no time of its own', () => {
    const read = edit(timeline(track([clip('A', 0, 50), dissolve(5, 10), clip('B', 100, 50)])));
    expect(read.frames.valueOf()).toBe(100);
    expect(map(read.dissolved)).toEqual([
      ['B', 95, 100, 45, 50, '1'],
      ['A', 50, 60, 50, 60, '1'],
    ]);
  });

  it('counts a clip in its own rate and the episode in that of the timeline', () => {
    const slow = { ...clip('A', 0, 0), source_range: range(100, 50, 50) };
    expect(map(edit(timeline(track([gap(25), slow]))).picture)).toEqual([['A', 100, 150, 25, 50, '1']]);
    const given = new Map([['a', { num: 100, den: 1 }]]);
    expect(map(edit(timeline(track([gap(25), slow])), null, given).picture)).toEqual([
      ['A', 200, 300, 25, 50, '1'],
    ]);
  });

  it('knows the exact rate that a decimal stands for', () => {
    const one = { ...clip('A', 0, 0), source_range: range(0, 24, 23.976023976023978) };
    expect(edit(timeline(track([one]))).rate).toEqual({ num: 24000, den: 1001 });
  });

  it('has sound tracks apart', () => {
    const read = edit(timeline(track([clip('A', 0, 50)]), track([clip('B', 0, 25)], { kind: 'Audio' })));
    expect(map(read.picture).map(([name]) => name)).toEqual(['A']);
    expect(read.sound.map(({ clip: name, track: on }) => [name, on])).toEqual([['B', 'A1']]);
  });

  it('hides clips under a generated picture, and leaves out what is switched off', () => {
    const title = clip('Title', 0, 10, { media_reference: { OTIO_SCHEMA: 'GeneratorReference.1' } });
    const off = clip('Off', 0, 10, { enabled: false });
    const read = edit(timeline(track([clip('A', 0, 30)]), track([off, title])));
    expect(map(read.picture)).toEqual([
      ['A', 0, 10, 0, 10, '1'],
      ['A', 20, 30, 20, 30, '1'],
    ]);
    expect(read.warnings.map(sayWarning)).toEqual(['“Off” is switched off and is left out.']);
  });

  it('has its marks where they are seen', () => {
    const mark = (start: number) => ({
      OTIO_SCHEMA: 'Marker.2',
      name: 'grind here',
      color: 'RED',
      marked_range: range(start, 0),
    });
    const read = edit(
      timeline(track([gap(10), clip('A', 100, 50, { markers: [mark(120), mark(10)], ...warp(2) })])),
    );
    expect(read.markers.map(({ record, ...rest }) => [record.valueOf(), rest])).toEqual([
      [20, { name: 'grind here', colour: 'RED' }],
    ]);
    expect(read.warnings.map(sayWarning).join()).toContain('A mark of “A” lies outside');
  });

  it('may point to the same thing twice', () => {
    const shared = { ...clip('A', 0, 25), OTIO_REF_ID: 'Clip-1' };
    const again = { OTIO_SCHEMA: 'SerializableObjectRef.1', id: 'Clip-1' };
    expect(map(edit(timeline(track([shared, again]))).picture)).toEqual([
      ['A', 0, 25, 0, 25, '1'],
      ['A', 0, 25, 25, 50, '1'],
    ]);
  });
});

function deep(levels: number): unknown {
  return levels === 0 ? track([clip('A', 0, 5)]) : stack([deep(levels - 1)]);
}

describe('A timeline that cannot be read is refused with a sentence', () => {
  const ref = { OTIO_SCHEMA: 'SerializableObjectRef.1', id: 'Stack-1' };
  const doubled = (levels: number): unknown =>
    Array.from({ length: levels }).reduce<unknown>(
      (inside, _none, index) =>
        stack([
          { ...(inside as object), OTIO_REF_ID: `Stack-${String(index)}` },
          { OTIO_SCHEMA: 'SerializableObjectRef.1', id: `Stack-${String(index)}` },
        ]),
      stack([]),
    );
  it.each<[string, string, string]>([
    ['cut off', `${timeline(track([clip('A', 0, 5)])).slice(0, -4)}`, 'Line 1: the timeline is no JSON'],
    [
      'broken in the third line',
      '{\n"OTIO_SCHEMA": "Timeline.1",\n"name": x}',
      'Line 3: the timeline is no JSON',
    ],
    ['something else', '{"cues":[]}', 'no OpenTimelineIO timeline'],
    ['a clip alone', JSON.stringify(clip('A', 0, 5)), 'holds no timeline'],
    ['nothing', timeline(), 'The timeline is empty.'],
    ['in a circle', timeline(stack([ref], { OTIO_REF_ID: 'Stack-1' }), track([gap(5)])), 'goes in a circle'],
    ['pointing nowhere', timeline(ref, track([gap(5)])), 'points to Stack-1, which is not there'],
    ['too deep', timeline(deep(80)), 'lies too deep'],
    ['growing without end', timeline(doubled(30), track([gap(5)])), 'more than can be unfolded'],
    ['a length below zero', timeline(track([clip('A', 0, -5)])), '“A” is shorter than nothing'],
    [
      'a rate of 0',
      timeline(track([{ ...clip('A', 0, 5), source_range: range(0, 5, 0) }])),
      '“A” counts in 0',
    ],
    [
      'no number',
      timeline(track([{ ...clip('A', 0, 5), source_range: range('x', 5) }])),
      '“A” has a time that is no number',
    ],
    ['too large a number', timeline(track([clip('A', 1e300, 5)])), '“A” has a time that is no number'],
    [
      'no range',
      timeline(track([gap(1), { OTIO_SCHEMA: 'Clip.2', name: 'A' }])),
      'does not say what is used of it',
    ],
    ['no item', timeline(track([gap(1), 7])), 'something that is no item'],
    ['an unknown item', timeline(track([gap(1), { OTIO_SCHEMA: 'Wormhole.1' }])), 'not understood'],
  ])('%s', (_name, text, sentence) => {
    const read = readOtio(text, { rate: null });
    expect(read.ok ? '' : read.error).toContain(sentence);
  });
});
