import { describe, expect, it } from 'vitest';
import { parseLength, parseLengths } from '../../../../src/domain/lengths/parse-length.ts';

// 1 in = 25.4 mm, 1 ft = 0.3048 m, 1 thou = 0.0254 mm exactly: yard and pound agreement of 1959, NIST SP 811.
describe('parseLength', () => {
  it.each([
    ['38.1 mm', '38.1', 'mm', 1],
    ['1-1/2"', '38.1', 'in', null],
    ['1 1/2 in', '38.1', 'in', null],
    ['1½ in', '38.1', 'in', null],
    ['5/32 in', '3.96875', 'in', null],
    ['1/64 inch', '0.396875', 'in', null],
    ['7/8 in.', '22.225', 'in', null],
    ['1.5 inches', '38.1', 'in', 1],
    [`3'-4"`, '1016', 'ft', 0],
    [`3' 4 1/2"`, '1028.7', 'ft', null],
    ['3 ft 4 in', '1016', 'ft', 0],
    ['3 ft. 4 in.', '1016', 'ft', 0],
    ['3ft4in', '1016', 'ft', 0],
    ['10 feet', '3048', 'ft', 0],
    ['40 thou', '1.016', 'thou', 0],
    ['12.5cm', '125', 'cm', 1],
    ['1.2 m', '1200', 'm', 1],
    ['9 µm', '0.009', 'um', 0],
    ['35.009 mm', '35.009', 'mm', 3],
    ['1,500 mm', '1500', 'mm', 0],
    ['12,5 mm', '12.5', 'mm', 1],
    ['0,125 mm', '0.125', 'mm', 3],
    ['.5 in', '12.7', 'in', 1],
    ['3-inch', '76.2', 'in', 0],
    ['38.1 millimetres', '38.1', 'mm', 1],
  ])('reads %s as %s mm, given in %s', (text, mm, unit, decimals) => {
    expect(parseLength(text)).toEqual({
      ok: true,
      value: { mm, unit, decimals, typed: text.replace(/\.$/, '') },
    });
  });

  it('takes a bare number in the unit of the field', () => {
    expect(parseLength('412', 'mm')).toMatchObject({ ok: true, value: { mm: '412', unit: 'mm' } });
    expect(parseLength('1-1/2', 'in')).toMatchObject({ ok: true, value: { mm: '38.1', unit: 'in' } });
  });

  it.each([
    ['', 'Write a size.'],
    ['412', 'has no unit'],
    ['40 x 40', 'has no unit'],
    ['soon', 'is no size'],
    ['-5 mm', 'below zero'],
    ['14 mil', 'mil means one here'],
    ['3 mm and a bit', 'is no size'],
    ['1/3 in', 'is no size'],
    ['3/2 in', 'is no size'],
    ['1/2 mm', 'is no size'],
    ['M12', 'is no size'],
    ['0.2 mm/rev', 'is no size'],
    ['5 ft-lb', 'is no size'],
    ['20 x 30 mm', 'more than one size'],
    ['9'.repeat(90), 'at most 80'],
  ])('says why %j is none', (text, sentence) => {
    const read = parseLength(text);
    expect(read.ok ? '' : read.error).toContain(sentence);
    expect(read.ok ? '' : read.error).toMatch(/\.$/);
  });
});

describe('parseLengths', () => {
  it.each([
    ['40 x 40 x 3 mm', ['40', '40', '3']],
    ['40x40x3mm', ['40', '40', '3']],
    ['80 × 20 × 140 mm', ['80', '20', '140']],
    ['2 in by 1/4 in', ['50.8', '6.35']],
    ['1-1/2 x 3/4"', ['38.1', '19.05']],
    ['35.002 to 35.018 mm', ['35.002', '35.018']],
    ['40 ± 0.1 mm', ['40', '0.1']],
  ])('reads %s', (text, mm) => {
    const read = parseLengths(text);
    expect(read.ok ? read.value.map((length) => length.mm) : read.error).toEqual(mm);
  });
});
