import { describe, expect, it } from 'vitest';
import { appearancesFromNotes } from '../../../../src/domain/appearances/appearances-from-notes.ts';

const rate = { num: 25, den: 1 };
const note = (frame: number, endFrame: number | null, ...partIds: string[]) => ({ frame, endFrame, partIds });

describe('appearancesFromNotes', () => {
  it('holds an instant until the next note', () => {
    const notes = [note(100, null, '117'), note(200, null)];
    expect(appearancesFromNotes({ notes, rate })).toEqual([{ partId: '117', from: 100, to: 200 }]);
  });

  it('holds an instant for 20 s at most', () => {
    const notes = [note(100, null, '117'), note(5000, null)];
    expect(appearancesFromNotes({ notes, rate })).toEqual([{ partId: '117', from: 100, to: 600 }]);
  });

  it('holds two notes of one frame until the next later one', () => {
    const notes = [note(100, null, '117'), note(100, null, '119'), note(150, null)];
    expect(appearancesFromNotes({ notes, rate }).map(({ to }) => to)).toEqual([150, 150]);
  });

  it('takes a range as it is, over the notes inside it', () => {
    const notes = [note(100, 5000, '117'), note(150, null)];
    expect(appearancesFromNotes({ notes, rate })).toEqual([{ partId: '117', from: 100, to: 5000 }]);
  });

  it('ends with the video, and drops what begins after it', () => {
    const notes = [note(100, null, '117'), note(400, null, '119')];
    const byHand = [{ partId: '118', from: 250, to: 900 }];
    expect(appearancesFromNotes({ notes, byHand, rate, lengthFrames: 300 })).toEqual([
      { partId: '117', from: 100, to: 300 },
      { partId: '118', from: 250, to: 300 },
    ]);
  });

  it('puts what was set by hand in its place among the rest', () => {
    const notes = [note(100, 200, '117'), note(300, 400, '119')];
    const byHand = [{ partId: '118', from: 250, to: 280 }];
    expect(appearancesFromNotes({ notes, byHand, rate }).map(({ partId }) => partId)).toEqual([
      '117',
      '118',
      '119',
    ]);
  });

  it('counts the 20 s in whole frames of an uneven rate', () => {
    const notes = [note(0, null, '117')];
    // 20 s at 30000/1001 are 599.4 frames; computed.
    expect(appearancesFromNotes({ notes, rate: { num: 30000, den: 1001 } })[0]?.to).toBe(599);
  });
});
