import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Appearance } from '../../../../src/domain/appearances/appearance.ts';
import { MOST_PARTS, partsAt } from '../../../../src/domain/appearances/parts-at.ts';

const on = (partId: string, from: number, to: number): Appearance => ({ partId, from, to });

describe('partsAt', () => {
  it('shows nothing before the first part comes into view', () => {
    expect(partsAt(9, [on('117', 10, 20)])).toEqual([]);
  });

  it('holds a part up to, not including, the end', () => {
    const list = [on('117', 10, 20)];
    expect(partsAt(10, list)).toEqual([{ partId: '117', filled: true, since: 10 }]);
    expect(partsAt(19, list)[0]?.filled).toBe(true);
    expect(partsAt(20, list)).toEqual([{ partId: '117', filled: false, since: 10 }]);
  });

  it('puts those in view first, then the newest of the chapter', () => {
    const list = [on('117', 0, 300), on('119', 10, 20), on('118', 30, 40), on('120', 50, 60)];
    expect(partsAt(100, list).map(({ partId }) => partId)).toEqual(['117', '120', '118', '119']);
  });

  it('forgets with a new chapter what is no longer in view', () => {
    const list = [on('117', 0, 300), on('119', 10, 20), on('118', 110, 120)];
    expect(partsAt(130, list, [0, 100]).map(({ partId }) => partId)).toEqual(['117', '118']);
    expect(partsAt(130, list, [100, 0, 200]).map(({ partId }) => partId)).toEqual(['117', '118']);
  });

  it('shows a part once, since it last came, while any of its stretches holds', () => {
    const list = [on('117', 0, 100), on('117', 50, 60)];
    expect(partsAt(70, list)).toEqual([{ partId: '117', filled: true, since: 50 }]);
  });

  it('leaves the oldest out when five are in view', () => {
    const list = ['a', 'b', 'c', 'd', 'e'].map((partId, index) => on(partId, index, 100));
    expect(partsAt(50, list).map(({ partId }) => partId)).toEqual(['e', 'd', 'c', 'b']);
  });

  const lists = fc.array(
    fc
      .tuple(fc.constantFrom(...'abcdefgh'), fc.nat(200), fc.integer({ min: 1, max: 60 }))
      .map(([partId, from, length]) => on(partId, from, from + length)),
  );

  it('keeps its promises for every list', () => {
    fc.assert(
      fc.property(lists, fc.array(fc.nat(200)), fc.nat(260), (list, chapters, frame) => {
        const shown = partsAt(frame, list, chapters);
        const ids = shown.map(({ partId }) => partId);
        expect(shown.length).toBeLessThanOrEqual(MOST_PARTS);
        expect(new Set(ids).size).toBe(ids.length);
        expect(shown.every(({ since }) => since <= frame)).toBe(true);
        const filled = shown.map((part) => part.filled);
        expect(filled).toEqual([...filled].sort((a, b) => Number(b) - Number(a)));
        for (const part of shown)
          expect(part.filled).toBe(
            list.some(({ partId, from, to }) => partId === part.partId && from <= frame && frame < to),
          );
      }),
    );
  });

  it('leaves out nobody in view while there is room', () => {
    fc.assert(
      fc.property(lists, fc.nat(260), (list, frame) => {
        const inView = new Set(
          list.filter(({ from, to }) => from <= frame && frame < to).map((one) => one.partId),
        );
        const filled = partsAt(frame, list).filter((part) => part.filled);
        expect(filled.length).toBe(Math.min(inView.size, MOST_PARTS));
      }),
    );
  });
});
