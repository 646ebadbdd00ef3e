import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findSizes } from '../../../../src/domain/lengths/find-sizes.ts';

const NAMES = ['101', '104', '117', '118', '125', 'K03', 'A-2'];
const typed = (text: string) => findSizes(text, { names: NAMES }).map((size) => size.typed);

// Sentences of our own: no published set covers sizes in a shop's notes.
describe('Sizes in a sentence', () => {
  it.each<[string, string[]]>([
    ['Face and centre the drum shaft, 412 mm, from 40 mm bright bar.', ['412 mm']],
    ['Bearing seats came out at 35.009 mm.', ['35.009 mm']],
    ['Plan says 35 k6: 35.002 to 35.018 mm.', ['35.002 to 35.018 mm']],
    ['Slots are 14 × 30 mm.', ['14 × 30 mm']],
    ['A block of 40 x 40 x 3 mm and one of 2-1/2" x 1/4".', ['40 x 40 x 3 mm', '2-1/2" x 1/4"']],
    ['Cut at 1-1/2 in, then file.', ['1-1/2 in']],
    ['Cut it to 3 in. Then file.', ['3 in']],
    ['Make it 3 in. long.', ['3 in.']],
    ['It stands 3\'-4" high, or 3 ft 4 in.', [`3'-4"`, '3 ft 4 in']],
    ['Take 5 thou off, 0.127 mm.', ['5 thou', '0.127 mm']],
    ['(12.5cm) and ø30 mm', ['12.5cm', '30 mm']],
    ['A gap of 10–12 mm, not 10-12mm.', ['10–12 mm', '10-12mm']],
    ['Slots: 14 or 40 mm long?', ['14 or 40 mm']],
    ['Bore 40 ± 0.1 mm.', ['40 ± 0.1 mm']],
    ['The 3 in wide one, 1,500 mm up.', ['3 in', '1,500 mm']],
    ['Drill 1/2 in from the edge.', ['1/2 in']],
    ['A 3-inch gap and a 6 mm key.', ['3-inch', '6 mm']],
    ['...40 mm', ['40 mm']],
  ])('%s', (text, sizes) => {
    expect(typed(text)).toEqual(sizes);
  });
});

describe('What is no size', () => {
  it.each([
    'M12, M12x1.75 and M12 x 1.75 studs',
    '3/8-16 UNC and 1/4-20, 1 1/4-7, #10-32',
    'G 3/8 ports where the plans say 3/8 NPT',
    '1/2" BSP, 1/2 BSP, 1 in NPT, 1-1/4" NPT',
    'E7018, 3.2 mm rods, 115 A',
    '6013 at 90 A, then E7018 2.5 mm',
    '16 ga sheet, 14 SWG, 16 gauge',
    'Bearing 6207 and 6207-2RS',
    '35 k6, H7, 25 H7/k6, 35 mm k6',
    'Part 118 in place, 104 in the vice',
    'Weld 118 in.',
    'Adapter 125 on both lines, K03 too, not A-2',
    'letter F drill, #7 drill, No. 7 drill',
    '14:22, 3:41, 2026-11-12, 12 Nov 2026, 12/11/2026',
    '$20, £4.50 and €3',
    'scale 1:10, ratio 2:1',
    '2 needed, 4 off',
    'version 2.1.0, v3',
    '1920x1080, 3840 × 2160, 1080p',
    '0.2 mm/rev, 60 m/min, 12 mm²',
    '30 ft-lb, 5 in-lb, 20 ft lb',
    'Two of 101 in 2026',
    '2 in the bin, 3 in a row, 1/2 in the vice',
    '“12 mm plate”, 50 mm angle, 30 mm square tube, 6 mm stainless',
    'He said "it is 40" and "part 3"',
    "The '80' of it, the 90's",
    'C0043 mm, A-40 mm, 1.2.3 mm',
    '3 m 20 s in',
    '14 mil or so',
    '',
  ])('%s', (text) => {
    expect(typed(text)).toEqual([]);
  });
});

describe('A name beside a size', () => {
  it('leaves the size to be found', () => {
    expect(typed('Part 118 is 140 mm long')).toEqual(['140 mm']);
    expect(typed('M12 x 50 mm from the end')).toEqual(['50 mm']);
    expect(typed('3/8-16 UNC, 1-1/2 in deep')).toEqual(['1-1/2 in']);
  });

  it('gives way to a size that is longer', () => {
    expect(typed('It is 118 mm long')).toEqual(['118 mm']);
    expect(typed('Sheet cut to 1220 x 2440 mm')).toEqual(['1220 x 2440 mm']);
  });

  it('is no member of a range or choice', () => {
    expect(typed('118 or 40 mm')).toEqual(['40 mm']);
  });
});

describe('The values', () => {
  it('take their unit from the one behind them', () => {
    const [size] = findSizes('40 x 40 x 3 mm');
    expect(size?.values.map(({ mm, unit, typed: own }) => [mm, unit, own])).toEqual([
      ['40', 'mm', '40'],
      ['40', 'mm', '40'],
      ['3', 'mm', '3 mm'],
    ]);
    expect(size?.join).toBe('by');
  });
});

describe('Every text', () => {
  const piece = fc.constantFrom(
    ...[
      '40',
      '1-1/2',
      '3/8',
      '35.009',
      '118',
      'M12',
      ' ',
      ' ',
      'x',
      ' x ',
      ' to ',
      'mm',
      ' mm',
      ' in',
      '"',
      "'",
      '-',
    ],
    ...['.', ',', ' or ', 'NPT', 'k6', '6207', ' the ', '½', '$', '(', ')', '🔩', 'é', '\n', ':', '/', 'ft'],
  );
  const texts = fc.array(piece, { maxLength: 30 }).map((pieces) => pieces.join(''));

  it('is the same when its pieces are joined again, and no two overlap', () => {
    fc.assert(
      fc.property(fc.oneof(texts, fc.string({ unit: 'grapheme' })), (text) => {
        let joined = '';
        let at = 0;
        for (const { start, end, typed: own } of findSizes(text, { names: NAMES })) {
          expect(start).toBeGreaterThanOrEqual(at);
          expect(end).toBeGreaterThan(start);
          expect(text.slice(start, end)).toBe(own);
          joined += text.slice(at, start) + own;
          at = end;
        }
        expect(joined + text.slice(at)).toBe(text);
      }),
    );
  });

  it('is read in a time that grows with its length only', () => {
    const started = performance.now();
    findSizes('40 x '.repeat(400));
    findSizes('"1 '.repeat(700));
    expect(performance.now() - started).toBeLessThan(2000);
  });
});
