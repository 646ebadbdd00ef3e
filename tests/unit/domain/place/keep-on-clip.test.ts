import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { type Edit } from '../../../../src/domain/edit/edit.ts';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { type Position } from '../../../../src/domain/positions.ts';
import { convertEndFrame, convertFrame } from '../../../../src/domain/time/frames.ts';
import { keepOnClip } from '../../../../src/domain/place/keep-on-clip.ts';
import { nameByFootage } from '../../../../src/domain/place/name-by-footage.ts';
import { type EditedClip, placeAnchors } from '../../../../src/domain/place/place-anchors.ts';
import { rateOf } from '../../../../src/domain/edit/edit.ts';

const PAL = { num: 25, den: 1 };

function edit(rate: Position['rate'], ...lines: readonly string[]): Edit {
  const read = readEdl(lines.join('\n'), { rate });
  if (!read.ok) throw new Error(read.error);
  return nameByFootage(read.value, new Map([...'ABC'].map((name) => [name, `id-${name}`])));
}

const footage = (rate: Position['rate']): EditedClip[] =>
  [...'ABC'].map((name) => ({
    id: `id-${name}`,
    name: `id-${name}`,
    start: null,
    length: null,
    rate,
    pace: new Fraction(1),
    clock: [],
    label: new Fraction(name === 'B' ? 3600 : 0),
  }));

function thereAndBack(of: Edit, clips: readonly EditedClip[], position: Position) {
  const kept = keepOnClip(of, new Map(clips.map((clip) => [clip.id, clip])), position, 'picture');
  if (kept === null) return null;
  const seconds = (frame: number) => new Fraction(frame).div(rateOf(kept.rate));
  const [placed] = placeAnchors(of, clips, [
    {
      clock: 'clip',
      clip: kept.clip,
      at: seconds(kept.frame),
      until: kept.endFrame === null ? null : { clip: kept.endClip, at: seconds(kept.endFrame) },
      sense: 'picture',
    },
  ]);
  return placed!;
}

/** Three clips, each used once or in stretches that do not repeat, with black from 100 to 150. */
const CUT = (rate: Position['rate']) =>
  edit(
    rate,
    '1 A V C 10 60 0 50',
    '2 B V C 01:00:00:10 01:00:02:10 50 100',
    '3 C V C 0 50 150 200',
    '4 A V C 70 170 200 300',
  );

describe('A position typed in an episode', () => {
  it.each([
    ['the clip’s rate is the edit’s', PAL, PAL],
    ['the clip runs faster', { num: 60000, den: 1001 }, PAL],
    ['the clip runs slower', { num: 24000, den: 1001 }, { num: 30, den: 1 }],
    ['the video counts in milliseconds', PAL, { num: 1000, den: 1 }],
  ])('comes back to the frames it was typed at when %s', (_when, clipRate, typedRate) => {
    const cut = CUT(PAL);
    const clips = footage(clipRate);
    const last = (300 * typedRate.num) / 25 / typedRate.den;
    fc.assert(
      fc.property(fc.integer({ min: 0, max: last - 2 }), fc.integer({ min: 1, max: last }), (frame, more) => {
        const endFrame = Math.min(frame + more, last);
        const placed = thereAndBack(cut, clips, { frame, endFrame, rate: typedRate });
        if (placed === null) return;
        expect(placed.status).toBe('placed');
        expect(Math.floor(placed.places[0]!.at.valueOf())).toBe(convertFrame(frame, typedRate, PAL));
        // In black nothing says where it ends: the end of the segment that it begins in does then.
        const black = convertEndFrame(endFrame, typedRate, PAL);
        if (black <= 100 || black > 150)
          expect(Math.ceil(placed.end!.valueOf())).toBe(convertEndFrame(endFrame, typedRate, PAL));
      }),
    );
  });

  it('stays an episode time in black', () => {
    expect(thereAndBack(CUT(PAL), footage(PAL), { frame: 120, endFrame: null, rate: PAL })).toBeNull();
  });

  it('over several cuts ends where the next edit has its end', () => {
    const clips = footage(PAL);
    const kept = keepOnClip(
      CUT(PAL),
      new Map(clips.map((clip) => [clip.id, clip])),
      { frame: 20, endFrame: 180, rate: PAL },
      'picture',
    )!;
    const next = edit(PAL, '1 A V C 0 60 0 60', '2 C V C 10 50 60 100');
    const [placed] = placeAnchors(next, clips, [
      {
        clock: 'clip',
        clip: kept.clip,
        at: new Fraction(kept.frame, 25),
        until: { clip: kept.endClip, at: new Fraction(kept.endFrame!, 25) },
        sense: 'picture',
      },
    ]);
    expect([placed!.places[0]!.at.valueOf(), placed!.end?.valueOf()]).toEqual([30, 80]);
  });
});
