import Fraction from 'fraction.js';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findSizes } from '../../../src/domain/lengths/find-sizes.ts';
import { describeSize } from '../../../src/features/episodes/components/companion/describe-size.ts';

function described(text: string) {
  return findSizes(text).map(describeSize);
}

describe('a size in a note', () => {
  it('stands as it was typed, with the other system beside it', () => {
    expect(described('Face it to 412 mm.')).toEqual([{ mm: '412 mm', inch: '16 7/32 in', given: 'mm' }]);
    expect(described('Slots of 1-1/2 in.')).toEqual([{ mm: '38.1 mm', inch: '1-1/2 in', given: 'inch' }]);
  });

  it('names its unit once when several hang together', () => {
    expect(described('A plate of 420 x 420 mm goes here.')[0]?.inch).toBe('16 17/32 × 16 17/32 in');
  });

  it('has limits converted inwards', () => {
    expect(described('The plan says 35.002 to 35.018 mm.')).toEqual([
      { mm: '35.002 to 35.018 mm', inch: '1.37804 to 1.37866 in', given: 'mm' },
    ]);
  });

  it('never reads an inch limit that lies outside the limits given', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1000, max: 90_000 }), fc.integer({ min: 1, max: 60 }), (low, width) => {
        const [least, most] = [low / 1000, (low + width) / 1000].map((value) => value.toFixed(3));
        const inch = described(`from ${String(least)} to ${String(most)} mm`)[0]?.inch;
        const read = /^([\d.]+) to ([\d.]+) in$/.exec(inch ?? '');
        if (read === null) return inch === undefined;
        const [, from = '', to = ''] = read;
        return (
          new Fraction(from).mul('25.4').gte(String(least)) && new Fraction(to).mul('25.4').lte(String(most))
        );
      }),
    );
  });

  it('reads a tolerance as limits', () => {
    expect(described('Bore it 40 ± 0.1 mm deep.')[0]?.inch).toBe('1.571 to 1.578 in');
  });
});
