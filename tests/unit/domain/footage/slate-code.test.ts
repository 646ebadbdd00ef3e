import fc from 'fast-check';
import { expect, test } from 'vitest';
import { readSlateCode, writeSlateCode } from '../../../../src/domain/footage/slate-code.ts';

const instant = fc.integer({ min: 0, max: 4_102_444_800_000 });

test('a slate’s code says its instant', () => {
  fc.assert(
    fc.property(instant, (at) => {
      expect(readSlateCode(writeSlateCode(at))).toEqual({ ok: true, value: at });
    }),
  );
});

test('a code with one digit read wrong, or two swapped, is not believed', () => {
  fc.assert(
    fc.property(instant, fc.nat(14), fc.integer({ min: 1, max: 9 }), (at, place, by) => {
      const code = writeSlateCode(at);
      const digit = String((Number(code[place]) + by) % 10);
      expect(readSlateCode(code.slice(0, place) + digit + code.slice(place + 1)).ok).toBe(false);
      const [a = '', b = ''] = [code[place], code[place + 1]];
      if (a !== b && b !== '')
        expect(readSlateCode(code.slice(0, place) + b + a + code.slice(place + 2)).ok).toBe(false);
    }),
  );
});

test.each(['', 'https://example.com', '1788000000000', '1788000000000000'])(
  'the text %j is no code of a slate',
  (text) => {
    expect(readSlateCode(text).ok).toBe(false);
  },
);
