import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { type Dialect, type Finding, type ListedPart } from '../../../../src/domain/findings/finding.ts';
import { readFindings } from '../../../../src/domain/findings/read-findings.ts';

const PARTS: readonly ListedPart[] = [
  { number: '104', name: 'gusset', aliases: [] },
  { number: '106', name: 'platen', aliases: [], sizesMm: [160, 12] },
  { number: '118', name: 'bearing housing', aliases: [] },
  { number: '119', name: 'ball bearing', aliases: ['bearing'] },
  { number: '120', name: 'drum', aliases: [] },
  { number: '105', name: 'foot', aliases: [] },
  { number: 'K03', name: 'tiller', aliases: ['stick'] },
  { number: 'A-2', name: 'end rail', aliases: [] },
  { number: 'C4', name: 'motor plate', aliases: [] },
  { number: '7', name: 'scroll', aliases: [] },
  { number: '009', name: 'drain cock', aliases: [] },
];

const read = (words: string | readonly string[], dialect?: Dialect): Finding[] =>
  readFindings(
    [words].flat().map((line, index) => ({ start: index * 4000, end: index * 4000 + 3800, lines: [line] })),
    PARTS,
    dialect,
  );
const parts = (words: string | readonly string[]) =>
  read(words).flatMap(({ kind, part }) => (kind === 'part' ? [part] : []));
const told = (words: string | readonly string[], dialect?: Dialect) =>
  read(words, dialect).flatMap(({ kind, what, text, values }) =>
    kind === 'size' || kind === 'setting' || kind === 'rating'
      ? [
          [
            what ?? kind,
            text ?? (values ?? []).map(({ value, unit }) => `${String(value)} ${unit}`).join(', '),
          ].join(': '),
        ]
      : [],
  );

describe('A part', () => {
  it.each([
    ['by its number after the word', 'this is part one oh six here', ['106']],
    ['digit by digit', "that's one one eight on the list", ['118']],
    ['in numerals', 'part 118 that goes in', ['118']],
    ['with its zeros', 'double oh nine goes at the bottom', ['009']],
    ['by a letter as it is said', 'kay oh three is varnished', ['K03']],
    ['without the zero of the list', 'part k three is varnished', ['K03']],
    ['with a dash', 'a dash two is cut', ['A-2']],
    [
      'by a letter that is heard as a word, beside its name',
      'the motor plate see four came out well',
      ['C4'],
    ],
    ['by a small number', 'number seven on the sheet', ['7']],
    ['in the plural', 'both gussets are in', ['104']],
    ['by an alias', 'push the stick over', ['K03']],
    ['misheard', "the bearing how's in is bored", ['118']],
    ['and its number over two captions, once', ['here is the platinum', 'one oh six it squashes'], ['106']],
    ['put right, as what it was put right to', 'part one eighteen sorry one nineteen', ['119']],
    ['denied all the same', "this isn't the drum", ['120']],
  ] as const)('is found %s', (_how, words, expected) => {
    expect(parts(words)).toEqual(expected);
  });

  it.each([
    ['a verb', 'you can stick that on later'],
    ['an oil drum', 'that oil drum is for offcuts'],
    ['a unit', 'it is six foot long'],
    ['a reason', 'number seven reason to wear gloves'],
    ['an episode', 'see you in part seven'],
    ['what somebody sees', 'you can see four of them'],
    ['an article and a count', 'a two inch bolt'],
    ['a setting', 'the welder is on one oh six amps'],
  ])('is not found in %s', (_what, words) => {
    expect(parts(words)).toEqual([]);
  });
});

describe('A number', () => {
  it.each([
    ['cut at five thirty seconds', ['size: 0.15625 in']],
    ['an inch and a quarter wide', ['size: 1.25 in']],
    ['half a mil out', ['size: 0.5 mm']],
    ['forty by forty by three box', ['size: 40 mm, 40 mm, 3 mm']],
    ['seventy to seventy five amps', ['current: 70 A, 75 A']],
    ['eighty sorry eighteen mil plate', ['size: 18 mm']],
    ['450 mil call it 18 inches', ['size: 450 mm']],
    ['tapped m ten for the pulley', ['size: M10 thread']],
    ['three eighths bsp on that end', ['size: G 3/8 thread']],
    ['bolts down with half thirteens', ['size: 1/2-13 UNC thread']],
    ['3.2 mil seventy eighteens', ['electrode: 3.2 mm', 'electrode: E7018']],
    ['on to the 60 13 rods', ['electrode: E6013']],
    ['sanding so eighty then one twenty', ['grit: 80', 'grit: 120']],
    ['the feed at point one of a mil a rev', ['feed: 0.1 mm/rev']],
    ['set at a hundred and sixty bar', ['pressure: 160 bar']],
    ['it is good for 200 bar', ['rating: 200 bar']],
    ['torqued to fifty five foot pounds', ['torque: 55 ft-lb']],
    ['an eleven gallon a minute pump', ['rating: 11 gpm']],
    ['a nine inch grinder', []],
    ['a couple of thou of slop', []],
    ['it was forty bucks in nineteen fifty', []],
  ])('%j', (words, expected) => {
    expect(told(words)).toEqual(expected);
  });

  it('without a unit is in the one being worked in', () => {
    expect(told(['welder on seventy amps', 'and that blew through so down to sixty'])).toEqual([
      'current: 70 A',
      'current: 60 A',
    ]);
  });

  it('follows the dialect of the maker', () => {
    expect(told('ten mil of clearance', { mil: 'thou' })).toEqual(['size: 10 thou']);
    const [ton] = read('a four ton jack', { ton: 'short' });
    // 2000 lb under standard gravity: NIST Handbook 44, appendix C; 8896.443230521 N.
    const si = ton?.values?.[0]?.si;
    expect(si?.unit).toBe('N');
    expect(new Fraction(si?.value ?? 0).valueOf()).toBeCloseTo(4 * 8896.443230521, 6);
  });

  it('is kept exactly, and in its SI unit', () => {
    expect(read('cut at five thirty seconds')[0]?.values).toEqual([
      { value: 0.15625, unit: 'in', exact: '5/32', si: { value: '127/32000', unit: 'm' } },
    ]);
  });
});

describe('A finding', () => {
  it('names its words, their place and its rule', () => {
    expect(read(['so here we are', 'it is twelve mil plate'])[0]).toMatchObject({
      kind: 'size',
      rule: 'size',
      span: { from: { cue: 2, character: 6 }, to: { cue: 2, character: 16 }, words: 'twelve mil' },
    });
  });

  it('is offered as a correction where a size slips from the one of the parts list', () => {
    const corrections = (words: string) =>
      read(words).flatMap(({ kind, sentence }) => (kind === 'correction' ? [sentence] : []));
    expect(corrections('the platen is sixty mil wide')).toEqual(['Says 60 mm; part 106 is 160 mm.']);
    expect(corrections('the platen is a hundred and sixty mil wide')).toEqual([]);
    expect(corrections('the platen has a thirty mil hole')).toEqual([]);
  });

  it('is made of nothing in another language but numbers and part numbers', () => {
    const found = read(
      'also das hier ist der tisch und wir schneiden das blech auf zwölf millimeter ich weiß noch nicht',
    );
    expect(found.filter(({ kind }) => kind !== 'size' && kind !== 'part')).toEqual([]);
  });

  it('stands inside its caption and is the same every time, whatever the words', () => {
    const word = fc.constantFrom(
      ...'a the part number one oh six forty by to and half inch mil amps point see four drum foot set at m ten bsp thirty seconds sorry no never hand leak 3/8 - "7"'.split(
        ' ',
      ),
    );
    fc.assert(
      fc.property(fc.array(fc.array(word, { maxLength: 12 }), { maxLength: 6 }), (lines) => {
        const cues = lines.map((line) => line.join(' '));
        const found = read(cues);
        for (const { span } of found) {
          expect(span.from.character).toBeLessThan(cues[span.from.cue - 1]?.length ?? 0);
          expect(span.to.character).toBeLessThanOrEqual(cues[span.to.cue - 1]?.length ?? 0);
          expect(span.seconds[0]).toBeLessThanOrEqual(span.seconds[1]);
        }
        expect(read(cues)).toEqual(found);
      }),
      { numRuns: 200 },
    );
  });

  it('is found in a caption of 10 000 characters too', () => {
    expect(
      read(`${'so and then the drum is big '.repeat(400)} it is twelve mil plate`).map(({ kind }) => kind),
    ).toEqual(['part', 'size']);
  });
});
