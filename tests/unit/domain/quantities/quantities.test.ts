import { describe, expect, it } from 'vitest';
import { formatNumber } from '../../../../src/domain/quantities/format-number.ts';
import { parseQuantity } from '../../../../src/domain/quantities/parse-quantity.ts';
import { type QuantityKind, unitFactor } from '../../../../src/domain/quantities/quantity.ts';

describe('Units', () => {
  // GNU units 2.22, which cites NIST SP 811; 231 in3 also NIST Handbook 44, appendix C.
  it.each<[QuantityKind, string, number]>([
    ['pressure', 'psi', 6894.757293168361],
    ['pressure', 'bar', 100_000],
    ['force', 'lbf', 4.4482216152605],
    ['force', 'kgf', 9.80665],
    ['force', 'short tons', 8896.443230521],
    ['force', 'long tons', 9964.01641818352],
    ['force', 'tonnes', 9806.65],
    ['power', 'hp', 745.6998715822702],
    ['power', 'PS', 735.49875],
    ['flow', 'gpm', 3.785411784],
    ['flow', 'imp gpm', 4.54609],
    ['mass', 'lb', 0.45359237],
    ['mass', 'short tons', 907.18474],
    ['mass', 'long tons', 1016.0469088],
  ])('%s: %s is %d', (kind, word, value) => {
    expect((unitFactor(kind, word)?.valueOf() ?? 0) / value).toBeCloseTo(1, 14);
  });
});

describe('A quantity as a maker types it', () => {
  it.each<[string, QuantityKind, number]>([
    ['165 bar', 'pressure', 16_500_000],
    ['2,400 psi', 'pressure', 2400 * 6894.757293168361],
    ['11 gpm', 'flow', 11 * 3.785411784],
    ['1-1/2 kW', 'power', 1500],
    ['7.5kW', 'power', 7500],
  ])('%s', (text, kind, value) => {
    const read = parseQuantity(text, kind);
    expect(read.ok ? read.value.value.valueOf() : read.error).toBeCloseTo(value, 6);
  });

  it.each<[string, QuantityKind, string]>([
    ['', 'pressure', 'Write a pressure'],
    ['165', 'pressure', 'has no unit'],
    ['165 mm', 'pressure', 'is no pressure'],
    ['-5 bar', 'pressure', 'not below zero'],
    ['some bar', 'pressure', 'is no pressure'],
    ['5 bar 3 psi', 'pressure', 'is no pressure'],
    ['20 tons', 'force', 'Say which'],
    ['9'.repeat(99), 'pressure', 'at most 60'],
  ])('%j as a %s gets a sentence', (text, kind, sentence) => {
    const read = parseQuantity(text, kind);
    expect(read.ok ? '' : read.error).toContain(sentence);
  });
});

describe('A number for reading', () => {
  it.each([
    [0, '0'],
    [31415.92, '31416'],
    [0.0123456, '0.012346'],
    [4.71, '4.71'],
    [1_234_567, '1234567'],
    [-0.5, '-0.5'],
  ])('%d is %s', (value, text) => {
    expect(formatNumber(value)).toBe(text);
  });
});
