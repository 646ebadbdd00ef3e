import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sayBytes } from '../../../src/domain/byte-sizes.ts';
import {
  partBytesFor,
  partCountFor,
  partLength,
  StartUploadInput,
} from '../../../src/features/files/file.ts';
import { sayLength, sayRate } from '../../../src/features/files/components/say-length.ts';
import { saySituation, situationOf } from '../../../src/features/files/components/upload/upload-state.ts';

describe('The parts of a file', () => {
  it('add up to it exactly, at most 10 000 of them, whatever its size', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 5 * 2 ** 40 }), (bytes) => {
        const count = partCountFor(bytes);
        const size = partBytesFor(bytes);
        expect(count).toBeLessThanOrEqual(10_000);
        expect(size % 2 ** 20).toBe(0);
        expect((count - 1) * size + partLength(bytes, count)).toBe(bytes);
        expect(partLength(bytes, count)).toBeGreaterThan(0);
      }),
    );
  });
});

describe('A name', () => {
  const named = (name: string) =>
    StartUploadInput.safeParse({ name, bytes: 1, fingerprint: 'a'.repeat(64) }).data?.name;

  it.each([
    ['C:\\card\\C0043.mp4', 'C0043.mp4'],
    ['../../etc/passwd', 'passwd'],
    ['bearing\u202egpj.exe', 'bearinggpj.exe'],
    ['Lager\u0308.jpg', 'Lager\u0308.jpg'],
  ])('%j loses its path and what cannot be seen', (given, kept) => {
    expect(named(given)).toBe(kept.normalize('NFC'));
  });

  it.each(['', '/', '\u200b'])('%j is none', (given) => {
    expect(named(given)).toBeUndefined();
  });
});

describe('A size in bytes', () => {
  it.each([
    [0, '0 bytes'],
    [1, '1 byte'],
    [1023, '1023 bytes'],
    [1024, '1.00 KiB'],
    [40 * 2 ** 20, '40.0 MiB'],
    [2 ** 30 - 1, '1.00 GiB'],
    [500 * 2 ** 30, '500 GiB'],
  ])('%i is said %s', (bytes, said) => {
    expect(sayBytes(bytes)).toBe(said);
  });
});

describe('A length', () => {
  it('is whole seconds, with hours when there are any', () => {
    expect(sayLength({ frames: 50, rate: { num: 25, den: 1 } })).toBe('0:02');
    expect(sayLength({ frames: 107_892, rate: { num: 30_000, den: 1001 } })).toBe('59:59');
    expect(sayLength({ frames: 3_723_000, rate: { num: 1000, den: 1 } })).toBe('1:02:03');
  });

  it('has a rate where frames mean something', () => {
    expect(sayRate({ num: 30_000, den: 1001 })).toBe('29.97 fps');
    expect(sayRate({ num: 1000, den: 1 })).toBeNull();
  });
});

describe('The row of an upload', () => {
  const going = { bytes: 100, confirmed: 20, paused: false, waiting: false, stopped: null };

  it.each([
    ['sending', going],
    ['finishing', { ...going, confirmed: 100 }],
    ['waiting', { ...going, waiting: true }],
    ['paused', { ...going, paused: true, waiting: true }],
    ['stopped', { ...going, paused: true, stopped: 'The connection did not hold.' }],
  ] as const)('says that it is %s', (situation, file) => {
    expect(situationOf(file)).toBe(situation);
    expect(saySituation(file) === '').toBe(situation === 'sending');
  });
});
