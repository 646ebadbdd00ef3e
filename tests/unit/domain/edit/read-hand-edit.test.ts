import { describe, expect, it } from 'vitest';
import { type HandClip, sayClipTime } from '../../../../src/domain/edit/hand-clip.ts';
import { readHandEdit } from '../../../../src/domain/edit/read-hand-edit.ts';

const RATE = { num: 25, den: 1 };
const clip = (id: string, name: string, more: Partial<HandClip> = {}): HandClip => ({
  id,
  name,
  rate: RATE,
  startLabel: null,
  drop: false,
  frames: 1000,
  ...more,
});
const CLIPS = [
  clip('a', 'C0043.MP4', { startLabel: 775 }),
  clip('b', 'C0044.MP4', { rate: { num: 50, den: 1 } }),
  clip('c', 'C0001.MP4'),
  clip('d', 'C0001.MP4'),
  clip('e', 'VID.MP4', { rate: { num: 1000, den: 1 }, frames: 5000 }),
];
const build = (text: string) => readHandEdit(text, 'Press 4', RATE, CLIPS);
const built = (text: string) => {
  const read = build(text);
  if (!read.ok) throw new Error(read.error);
  return read.value;
};

describe('An edit built by hand', () => {
  it('lays clips one after another, by their own labels and at their own rates', () => {
    const { edit, clipIds } = built(
      'clip,in,out\nc0043.mp4,00:00:31:00,00:00:33:00\nb,00:00:01:00,00:00:02:25\n',
    );
    expect(
      edit.picture.map(({ clip: name, source, record }) => [
        name,
        ...[source.in, source.out, record.in, record.out].map(Number),
      ]),
    ).toEqual([
      ['C0043.MP4', 775, 825, 0, 50],
      ['C0044.MP4', 50, 125, 50, 87.5],
    ]);
    expect(edit.frames.valueOf()).toBe(87.5);
    expect([...clipIds]).toEqual([
      ['C0043.MP4', 'a'],
      ['C0044.MP4', 'b'],
    ]);
    expect(edit.sound.map(({ track }) => track)).toEqual(['A1', 'A1']);
  });

  it('tells two clips of one name apart', () => {
    const { clipIds } = built('c,0,1\nd,0,1\nc,2,3');
    expect([...clipIds]).toEqual([
      ['C0001.MP4', 'c'],
      ['C0001.MP4 (2)', 'd'],
    ]);
  });

  it('takes seconds since the first frame where a clip has no labels', () => {
    const { edit } = built('VID.MP4,1.5,0:03');
    expect(edit.picture[0]?.source.in.valueOf()).toBe(1500);
    expect(sayClipTime(1500, CLIPS[4] ?? clip('', ''))).toBe('1.500');
  });

  it.each([
    ['', 'Add at least one clip, with its in and out.'],
    ['clip,in,out', 'Add at least one clip, with its in and out.'],
    ['C0099.MP4,0,1', 'Line 1: There is no clip “C0099.MP4” in the footage.'],
    ['C0001.MP4,0,1', 'Line 1: Several clips are called “C0001.MP4”: choose it in the list.'],
    ['a,00:00:33:00,00:00:31:00', 'Line 1: The out of C0043.MP4 does not come after its in.'],
    ['b,0,1\na,00:00:00:00,00:00:01:00', 'Line 2: C0043.MP4 runs from 00:00:31:00 to 00:01:11:00.'],
    ['c,00:00:39:00,00:00:41:00', 'Line 1: C0001.MP4 runs from 00:00:00:00 to 00:00:40:00.'],
    ['c,soon,1', 'Line 1: “soon” is no time of the clip. Write it as 00:00:31:20, or as 31.5 seconds in.'],
    ['c,00:00:01:25,3', 'Line 1: 00:00:01:25 has frames beyond 24.'],
  ])('says what is wrong with %j', (text, error) => {
    expect(build(text)).toEqual({ ok: false, error });
  });
});
