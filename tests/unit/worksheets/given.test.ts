import { expect, test } from 'vitest';
import { fitWorksheet } from '../../../src/domain/fits/fit-worksheet.ts';
import { holesWorksheet } from '../../../src/domain/holes/holes-worksheet.ts';
import {
  findErrors,
  findMissing,
  toGiven,
  toQuery,
  typedIn,
} from '../../../src/features/worksheets/given.ts';

const { inputs } = fitWorksheet;

test('an address carries the inputs of its worksheet and nothing else', () => {
  const query = new URLSearchParams('size=25&hole=H7&shaft=&colour=red');
  expect(typedIn(query, inputs)).toEqual({ size: '25', hole: 'H7' });
});

test('what was typed makes the address again', () => {
  const typed = { size: '1 1/2"', hole: 'H7', shaft: '' };
  expect(typedIn(new URLSearchParams(toQuery(typed)), inputs)).toEqual({ size: '1 1/2"', hole: 'H7' });
  expect(toQuery({ size: '' })).toBe('');
});

test('a box that is not ticked is a no', () => {
  expect(toGiven({ clevis: '16' }, holesWorksheet.inputs)).toMatchObject({ transverse: false });
  expect(toGiven({ transverse: 'yes' }, holesWorksheet.inputs)).toMatchObject({ transverse: true });
});

test('each input that cannot be read has a sentence of its own', () => {
  expect(findErrors({ size: 'big', hole: 'k6', shaft: '' }, inputs)).toEqual({
    size: expect.stringContaining('big') as string,
    hole: expect.stringContaining('capital letters are holes') as string,
  });
});

test('only what has to be given is missed', () => {
  expect(findMissing({ hole: 'H7' }, inputs)).toEqual(['Nominal size']);
});
