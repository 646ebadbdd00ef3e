import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { type Edit } from '../../../../src/domain/edit/edit.ts';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { cameraClock } from '../../../../src/domain/footage/camera-clock.ts';
import { type Anchor, type EditedClip, placeAnchors } from '../../../../src/domain/place/place-anchors.ts';

const T = Date.UTC(2026, 10, 12, 14, 21, 30);
const PAL = { num: 25, den: 1 };

function edit(...lines: readonly string[]): Edit {
  const read = readEdl(lines.join('\n'), { rate: PAL });
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

/** A minute of film whose labels begin at one hour; its camera is five seconds behind the shop. */
const aClip = (id: string, name: string, start: number): EditedClip => ({
  id,
  name,
  start: new Fraction(T + start * 1000),
  length: new Fraction(60),
  rate: PAL,
  pace: new Fraction(1),
  clock: cameraClock([{ camera: new Fraction(T), shop: new Fraction(T + 5000) }]),
  label: new Fraction(3600),
});
const FOOTAGE = [aClip('one', 'C0043', 0), aClip('two', 'P1', 30)];
const EDIT = edit(
  '1 C0043 V C 01:00:00:00 01:00:10:00 00:00:00:00 00:00:10:00',
  '2 C0043 V C 01:00:35:00 01:00:40:00 00:00:10:00 00:00:15:00',
  '3 P1    V C 01:00:00:00 01:00:20:00 00:00:15:00 00:00:35:00',
);

function place(anchor: Anchor) {
  const [found] = placeAnchors(EDIT, FOOTAGE, [anchor]);
  return [found!.status, ...found!.places.map(({ at }) => at.valueOf() / 25)];
}
const inShop = (seconds: number): Anchor => ({
  clock: 'shop',
  at: new Fraction(T + seconds * 1000),
  sense: 'picture',
});

describe('An anchor', () => {
  it('in the shop comes where the clip that ran is used, by the camera’s clock', () => {
    expect(place(inShop(5 + 2))).toEqual(['placed', 2]);
  });

  it('on two cameras at once has its main place in the longest use', () => {
    // 37 s into C0043 and 7 s into P1.
    expect(place(inShop(5 + 37))).toEqual(['placed', 22, 12]);
  });

  it('is placed by the camera that is used, when the other is not', () => {
    expect(place(inShop(5 + 45))).toEqual(['placed', 30]);
  });

  it('just before a clip goes to its edge and says so', () => {
    const [found] = placeAnchors(EDIT, FOOTAGE, [inShop(0)]);
    expect(found).toMatchObject({ status: 'placed', toEdge: true, clips: [{ id: 'one' }] });
  });

  it('where no clip ran has no place, and clips nearby to choose from', () => {
    const [near, far] = placeAnchors(EDIT, FOOTAGE, [inShop(-60), inShop(-3600)]);
    expect(near).toMatchObject({ status: 'no footage', places: [], clips: [{ id: 'one' }, { id: 'two' }] });
    expect(far).toMatchObject({ status: 'no footage', places: [], clips: [] });
  });

  it('on a clip counts from its first frame', () => {
    const on = (clip: string, at: number): Anchor => ({
      clock: 'clip',
      clip,
      at: new Fraction(at),
      sense: 'picture',
    });
    expect(place(on('two', 3))).toEqual(['placed', 18]);
    expect(place(on('one', 25))).toEqual(['lost']);
    expect(place(on('deleted', 3))).toEqual(['no footage']);
  });

  it('in the episode stays', () => {
    expect(place({ clock: 'episode', at: new Fraction(50) })).toEqual(['fixed']);
  });
});
