import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Description, writeDescription } from '../../../../src/domain/description/write-description.ts';

const WHOLE: Description = {
  about: 'A shaft, two bearings.\n\nAnd a thread that is not the plans’.',
  chapters: [0, 60_000, 120_000].map((start, index) => ({ start, title: `Chapter ${String(index + 1)}` })),
  parts: [
    { number: '117', name: 'drum shaft' },
    { number: '118', name: 'bearing housing' },
  ],
  links: [
    { label: 'This episode', address: 'https://shop.example/w/a/b/episodes/4' },
    { label: 'The build', address: 'https://shop.example/w/a/b' },
  ],
  corrections: [{ at: 61_500, text: 'The seat is 35.009 mm,\nnot 35.09.' }],
  cautions: [{ label: 'Pressure', words: 'Let the pressure down first.' }],
  terms: 'A guide, not a design.',
};

describe('The text that goes with a video', () => {
  it('has everything in its order, a line for each', () => {
    expect(writeDescription(WHOLE, 5000)).toEqual({
      leftOut: [],
      text: [
        'A shaft, two bearings.\nAnd a thread that is not the plans’.',
        'Chapters\n0:00 Chapter 1\n1:00 Chapter 2\n2:00 Chapter 3',
        'Take care\nPressure: Let the pressure down first.',
        'Corrections\n1:01 The seat is 35.009 mm, not 35.09.',
        'Links\nThis episode: https://shop.example/w/a/b/episodes/4\nThe build: https://shop.example/w/a/b',
        'Parts\n117 drum shaft\n118 bearing housing',
        'A guide, not a design.',
      ].join('\n\n'),
    });
  });

  it('drops the last parts first, and says how many', () => {
    const { text } = writeDescription(WHOLE, 5000);
    const shorter = writeDescription(WHOLE, text.length - 1);
    expect(shorter.text).toContain('117 drum shaft');
    expect(shorter.text).not.toContain('118');
    expect(shorter.leftOut).toEqual(['Left out: 1 of 2 parts.']);
  });

  it('keeps cautions longest, and never a part of the chapters', () => {
    expect(writeDescription(WHOLE, 60)).toEqual({
      text: 'Take care\nPressure: Let the pressure down first.',
      leftOut: [
        'Left out: 2 of 2 parts.',
        'Left out: a link.',
        'Left out: 2 of 2 lines of what it is about.',
        'Left out: the chapters.',
        'Left out: the link to its page.',
        'Left out: the terms.',
        'Left out: a correction.',
      ],
    });
  });

  it('is never longer than it may be, and is whole when there is room', () => {
    const whole = [...writeDescription(WHOLE, 5000).text].length;
    fc.assert(
      fc.property(fc.integer({ min: 0, max: whole + 50 }), (length) => {
        const { text, leftOut } = writeDescription(WHOLE, length);
        expect([...text].length).toBeLessThanOrEqual(length);
        expect(leftOut.length === 0).toBe(length >= whole);
      }),
    );
  });

  it('counts a character that takes two places as one', () => {
    const about = { ...WHOLE, chapters: [], parts: [], links: [], corrections: [], cautions: [], terms: '' };
    expect(writeDescription({ ...about, about: '🔩🔩🔩' }, 3).text).toBe('🔩🔩🔩');
  });
});
