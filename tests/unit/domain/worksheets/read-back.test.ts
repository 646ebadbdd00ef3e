import { describe, expect, test } from 'vitest';
import { sayLength, sayLengths, sayQuantity } from '../../../../src/domain/worksheets/read-back.ts';

describe('a length is read back', () => {
  test.each([
    ['1-1/2 in', '38.1 mm · 1 1/2 in'],
    ['1 1/2"', '38.1 mm · 1 1/2 in'],
    ['38.1', '38.1 mm · 1.5 in · 1 1/2 in exactly'],
    ['38', '38 mm · 1.49606 in · 1 1/2 in is 0.1 mm more'],
    ['25', '25 mm · 0.98425 in · 63/64 in is 0.0031 mm more'],
    ['3.2', '3.2 mm · 0.12598 in · 1/8 in is 0.025 mm less'],
    ['5/32 in', '3.97 mm · 5/32 in'],
  ])('%s as %s', (text, said) => {
    expect(sayLength(text, 'mm')).toBe(said);
  });

  test('as inches where a bare number means inches', () => {
    expect(sayLength('2', 'in')).toMatch(/^50\.8 mm/);
  });

  test('as nothing when it cannot be read', () => {
    expect(sayLength('about that', 'mm')).toBeNull();
  });
});

test('lengths that stand together are read back in both systems', () => {
  expect(sayLengths('50x12')).toBe('50 × 12 mm · 1 31/32 × 15/32 in');
  expect(sayLengths('50 by')).toBeNull();
});

describe('a quantity is read back', () => {
  // 1 bar = 100 000 Pa and 1 psi = 6894.757 Pa: NIST SP 811, appendix B.
  test('as bar and psi', () => {
    expect(sayQuantity('165 bar', 'pressure')).toBe('165 bar · 2393.1 psi');
    expect(sayQuantity('2400 psi', 'pressure')).toBe('165.47 bar · 2400 psi');
  });

  test('in the usual unit where none was written', () => {
    expect(sayQuantity('1440', 'turning', 'rpm')).toBe('1440 rpm');
  });

  test('as nothing when its unit is missing', () => {
    expect(sayQuantity('165', 'pressure')).toBeNull();
  });
});
