import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { notePieces } from '../../../../src/domain/notes/note-pieces.ts';

const parts = ['101', '104', '115', '118', '125', 'K03', 'A-2'].map((number) => ({
  id: `id-${number}`,
  number,
}));
const show = (text: string, ...own: string[]) =>
  notePieces(text, { parts, ownPartIds: own.map((number) => `id-${number}`) })
    .filter(({ kind }) => kind !== 'text')
    .map((piece) => `${piece.kind} ${piece.text}`);

describe('notePieces', () => {
  it.each<[string, string[], string[]]>([
    ['Adapter 125 on both lines, 14 mm up.', ['125'], ['part 125', 'size 14 mm']],
    ['Adapter 125 on both lines.', [], []],
    ['Fits part 118.', [], ['part 118']],
    ['Tack parts 101 and 104, then K03.', [], ['part 101', 'part 104', 'part K03']],
    ['Parts 101–104 and a-2', [], ['part 101', 'part 104', 'part a-2']],
    ['Run 115 A on 115.', ['115'], ['part 115']],
    ['Cut 118 to 118 mm.', ['118'], ['part 118', 'size 118 mm']],
    ['C0118, 1180 and 118.5 are none', ['118'], []],
  ])('of %j', (text, own, pieces) => {
    expect(show(text, ...own)).toEqual(pieces);
  });

  it('are found soon in a text made to be slow', () => {
    const started = performance.now();
    notePieces(`part ${'a-'.repeat(900)}118!`, { parts });
    expect(performance.now() - started).toBeLessThan(1000);
  });

  it('give the text again when they are joined', () => {
    const words = fc.constantFrom('part ', '118', ' 40 mm', 'K03', ', ', '\n', '.', 'A-2', ' x ', '3/8', 'é');
    fc.assert(
      fc.property(
        fc.array(words).map((list) => list.join('')),
        (text) => {
          const pieces = notePieces(text, { parts, ownPartIds: ['id-118'] });
          expect(pieces.map((piece) => piece.text).join('')).toBe(text);
          expect(pieces.every((piece) => piece.text !== '')).toBe(true);
        },
      ),
    );
  });
});
