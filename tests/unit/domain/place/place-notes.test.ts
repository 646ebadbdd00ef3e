import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { type Edit } from '../../../../src/domain/edit/edit.ts';
import { readEdl } from '../../../../src/domain/edit/read-edl.ts';
import { carryNotes } from '../../../../src/domain/place/carry-notes.ts';
import { clipMomentUnder } from '../../../../src/domain/place/clip-moment-under.ts';
import { placeNotes, type Sense } from '../../../../src/domain/place/place-notes.ts';

const PAL = { num: 25, den: 1 };

function edit(...lines: readonly string[]): Edit {
  const read = readEdl(lines.join('\n'), { rate: PAL });
  if (!read.ok) throw new Error(read.error);
  return read.value;
}

const moment = (clip: string, frame: number, sense: Sense = 'picture') => ({
  clip,
  at: new Fraction(frame, 25),
  sense,
});

function place(of: Edit, clip: string, frame: number, sense: Sense = 'picture') {
  const [placed] = placeNotes(of, [moment(clip, frame, sense)]);
  return [placed!.status, ...placed!.places.map(({ at }) => at.valueOf())];
}

describe('A note on a clip', () => {
  const cut = edit('1 C0043 V C 1000 1050 0 50', '2 C0044 V C 0 25 50 75');

  it.each<[number, readonly unknown[]]>([
    [1000, ['placed', 0]],
    [1049, ['placed', 49]],
    // Half-open: frame 1050 is the first that is not in. The last one shown is 49.
    [1050, ['snapped', 49]],
    [1050 + 75, ['snapped', 49]],
    [1050 + 76, ['lost']],
    [999, ['snapped', 0]],
    [1000 - 75, ['snapped', 0]],
    [1000 - 76, ['lost']],
  ])('at frame %i of 1000 to 1050 is %j', (frame, expected) => {
    expect(place(cut, 'C0043', frame)).toEqual(expected);
  });

  it('is never moved to another clip', () => {
    expect(place(cut, 'C0045', 10)).toEqual(['lost']);
  });

  it('is found by the clip’s name without ending, or by its reel', () => {
    const named = edit('1 A003 V C 0 25 0 25', '* FROM CLIP NAME: C0043.MP4');
    for (const name of ['C0043.MP4', 'c0043', 'a003']) expect(place(named, name, 5)).toEqual(['placed', 5]);
  });

  it('has its main place in the longest use, then the others in order', () => {
    const teaser = edit('1 C0043 V C 40 50 0 10', '2 C0043 V C 0 100 10 110', '3 C0043 V C 45 55 110 120');
    expect(place(teaser, 'C0043', 47)).toEqual(['placed', 57, 7, 112]);
  });

  it('snaps to the nearest use only', () => {
    const two = edit('1 C0043 V C 0 25 0 25', '2 C0043 V C 75 100 25 50');
    expect(place(two, 'C0043', 40)).toEqual(['snapped', 24]);
    expect(place(two, 'C0043', 60)).toEqual(['snapped', 25]);
    // As far from the one as from the other: both, the earlier of two equal ones first.
    expect(place(two, 'C0043', 50)).toEqual(['snapped', 24, 25]);
  });

  it('follows the speed', () => {
    const fast = edit('1 C0043 V C 0 100 0 50', 'M2 C0043 050.0 0');
    expect(place(fast, 'C0043', 30)).toEqual(['placed', 15]);
    expect(place(fast, 'C0043', 31)).toEqual(['placed', 15.5]);
  });

  it('is at the start of a held frame, on the last of it when it lies behind', () => {
    const held = edit('1 C0043 V C 10 11 0 50', 'M2 C0043 000.0 10');
    expect(place(held, 'C0043', 10)).toEqual(['placed', 0]);
    expect(place(held, 'C0043', 12)[0]).toBe('snapped');
  });

  it('comes from the end when the clip plays backwards', () => {
    const back = edit('1 C0043 V C 0 50 0 50', 'M2 C0043 -025.0 0');
    expect(place(back, 'C0043', 49)).toEqual(['placed', 0]);
    expect(place(back, 'C0043', 0)).toEqual(['placed', 49]);
    expect(place(back, 'C0043', 60)).toEqual(['snapped', 0]);
  });

  it('is placed while its picture is dissolved out, but mainly where it is seen by itself', () => {
    const dissolve = edit(
      ...['1 A V C 0 50 0 50', '2 A V C 50 50 50 50', '2 B V D 010 0 50 50 100', '3 A V C 55 60 100 105'],
    );
    expect(place(dissolve, 'A', 52)).toEqual(['placed', 52]);
    expect(place(dissolve, 'A', 56)).toEqual(['placed', 101, 56]);
  });
});

describe('A note about what is said', () => {
  it('belongs to the sound, wherever other pictures lie over it', () => {
    const over = edit('1 C0043 AA C 0 100 0 100', '2 C0043 V C 0 50 0 50', '3 C0044 V C 0 50 50 100');
    expect(place(over, 'C0043', 75, 'sound')).toEqual(['placed', 75]);
    expect(place(over, 'C0043', 75)).toEqual(['snapped', 49]);
  });

  it('takes the picture when the edit has no sound track, and says so', () => {
    const silent = edit('1 C0043 V C 0 50 0 50');
    expect(placeNotes(silent, [moment('C0043', 5, 'sound'), moment('C0043', 5)])).toMatchObject([
      { status: 'placed', byPicture: true },
      { status: 'placed', byPicture: false },
    ]);
  });
});

describe('Any notes on any edit', () => {
  const event = fc.record({
    clip: fc.constantFrom('A', 'B', 'C'),
    from: fc.nat(400),
    length: fc.integer({ min: 1, max: 120 }),
    hole: fc.nat(20),
  });
  const edits = fc.array(event, { minLength: 1, maxLength: 25 }).map((events) => {
    let at = 0;
    const lines = events.map(({ clip, from, length, hole }, index) => {
      at += index === 0 ? 0 : hole;
      const line = `${String(index + 1)} ${clip} V C ${String(from)} ${String(from + length)} ${String(at)} ${String(at + length)}`;
      at += length;
      return line;
    });
    return edit(...lines);
  });
  const moments = fc.array(
    fc.tuple(fc.constantFrom('A', 'B', 'C', 'D'), fc.nat(700)).map(([clip, frame]) => moment(clip, frame)),
    { maxLength: 30 },
  );

  it('get the places that looking at each segment in turn gives', () => {
    fc.assert(
      fc.property(edits, moments, (of, all) => {
        placeNotes(of, all).forEach((placed, index) => {
          const { clip, at } = all[index]!;
          const frame = at.mul(25).valueOf();
          const uses = of.picture.filter((segment) => segment.clip === clip);
          const held = uses.filter(
            ({ source }) => source.in.valueOf() <= frame && frame < source.out.valueOf(),
          );
          const apart = uses.map(({ source }) =>
            Math.max(source.in.valueOf() - frame, frame - source.out.valueOf(), 0),
          );
          const expected = held.map(
            ({ source, record }) => record.in.valueOf() + frame - source.in.valueOf(),
          );
          if (held.length > 0) {
            expect(placed.status).toBe('placed');
            expect(placed.places.map((one) => one.at.valueOf()).sort((a, b) => a - b)).toEqual(
              expected.sort((a, b) => a - b),
            );
            const longest = Math.max(...held.map(({ record }) => record.out.sub(record.in).valueOf()));
            const { record } = placed.places[0]!.segment;
            expect(record.out.sub(record.in).valueOf()).toBe(longest);
          } else expect(placed.status).toBe(Math.min(...apart, Infinity) <= 75 ? 'snapped' : 'lost');
        });
      }),
      { numRuns: 60 },
    );
  });

  it('lie in the episode, and the clip’s moment under a placed note is the note’s own', () => {
    fc.assert(
      fc.property(edits, moments, (of, all) => {
        placeNotes(of, all).forEach(({ status, places }, index) => {
          for (const { at } of places) {
            expect(at.compare(0) >= 0 && at.compare(of.frames) < 0).toBe(true);
            if (status === 'placed') expect(clipMomentUnder(of, at, 'picture')).toEqual(all[index]);
          }
        });
      }),
      { numRuns: 60 },
    );
  });
});

describe('A moment of the episode', () => {
  it('has no clip beneath it in a gap, and the last frame first when it plays backwards', () => {
    const of = edit('1 C0043 V C 0 50 0 50', 'M2 C0043 -025.0 0', '2 C0044 V C 0 50 75 125');
    const under = (at: number) => {
      const found = clipMomentUnder(of, new Fraction(at), 'picture');
      return found === null ? null : [found.clip, found.at.mul(25).valueOf()];
    };
    expect([0, 49, 50, 74, 75, 125].map(under)).toEqual([
      ['C0043', 49],
      ['C0043', 0],
      null,
      null,
      ['C0044', 0],
      null,
    ]);
  });

  it('has the sound beneath it when sound is asked for', () => {
    const of = edit('1 C0043 AA C 0 100 0 100', '2 C0044 V C 0 100 0 100');
    expect(clipMomentUnder(of, new Fraction(5), 'sound')?.clip).toBe('C0043');
    expect(clipMomentUnder(of, new Fraction(5), 'picture')?.clip).toBe('C0044');
  });
});

describe('A new edit', () => {
  it('says which notes stay, move, are lost with their segment, and come back', () => {
    const old = edit('1 A V C 0 50 0 50', '2 B V C 0 50 50 100', '3 C V C 0 50 100 150');
    const next = edit('1 A V C 0 50 0 50', '2 C V C 0 50 50 100', '3 D V C 0 50 100 150');
    const carried = carryNotes(
      old,
      next,
      ['A', 'B', 'C', 'D', 'E'].map((clip) => moment(clip, 10)),
    );
    expect(
      carried.map(({ carry, by, dropped }) => [carry, by?.valueOf() ?? null, dropped?.clip ?? null]),
    ).toEqual([
      ['stays', 0, null],
      ['lost', null, 'B'],
      ['moves', -2, null],
      ['back', null, null],
      ['absent', null, null],
    ]);
  });
});
