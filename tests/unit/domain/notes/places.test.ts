import { describe, expect, it } from 'vitest';
import { convertPlace } from '../../../../src/domain/notes/convert-place.ts';
import { sortNotes } from '../../../../src/domain/notes/note-place.ts';
import { notesPastTheEnd } from '../../../../src/domain/notes/notes-past-the-end.ts';
import { isShownToViewers } from '../../../../src/domain/notes/shown-notes.ts';

describe('sortNotes', () => {
  it('goes by frame, then by what ends first, then as they came', () => {
    const notes = [
      { id: 'd', frame: 5, endFrame: 9 },
      { id: 'b', frame: 5, endFrame: null },
      { id: 'c', frame: 5, endFrame: null },
      { id: 'a', frame: 1, endFrame: null },
    ];
    expect(sortNotes(notes).map(({ id }) => id)).toEqual(['a', 'b', 'c', 'd']);
    expect(notes[0]?.id).toBe('d');
  });
});

describe('notesPastTheEnd', () => {
  it('begin at the length or later: the last frame is the one before', () => {
    const at = (frame: number) => ({ frame, endFrame: null });
    expect(notesPastTheEnd([at(99), at(100), at(101)], 100)).toEqual([at(100), at(101)]);
  });
});

describe('isShownToViewers', () => {
  it.each([
    ['viewers', false, null, true],
    ['viewers', true, null, false],
    ['viewers', false, '2026-11-12T10:00:00Z', false],
    ['team', false, null, false],
    ['person', false, null, false],
  ] as const)('of %s, proposed %s, deleted %s: %s', (audience, proposed, deletedAt, shown) => {
    expect(isShownToViewers({ audience, proposed, deletedAt })).toBe(shown);
  });
});

describe('convertPlace', () => {
  it('keeps a stretch of one frame', () => {
    const place = { frame: 10, endFrame: 11, rate: { num: 60, den: 1 } };
    expect(convertPlace(place, { num: 24, den: 1 })).toEqual({ frame: 4, endFrame: 5 });
  });

  it('keeps an instant an instant', () => {
    const place = { frame: 0, endFrame: null, rate: { num: 60, den: 1 } };
    expect(convertPlace(place, { num: 24, den: 1 })).toEqual({ frame: 0, endFrame: null });
  });
});
