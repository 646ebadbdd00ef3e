import { expect, test } from 'vitest';
import { driveWorksheet } from '../../../src/domain/drive/drive-worksheet.ts';
import { seatsWorksheet } from '../../../src/domain/fits/seats-worksheet.ts';
import { portsWorksheet } from '../../../src/domain/ports/ports-worksheet.ts';
import { ramWorksheet } from '../../../src/domain/ram/ram-worksheet.ts';
import { squareWorksheet } from '../../../src/domain/square/square-worksheet.ts';
import { runWorksheet } from '../../../src/domain/worksheets/worksheet.ts';
import { PRESS_PARTS } from '../../../src/seed/press-parts.ts';
import { PRESS_WORKSHEETS } from '../../../src/seed/press-worksheets.ts';

function inputsOf(sheet: string): Readonly<Record<string, string>> {
  const found = PRESS_WORKSHEETS.find((worksheet) => worksheet.sheet === sheet);
  if (!found) throw new Error(`The demo has no worksheet ${sheet}.`);
  return found.inputs;
}

test('the demo’s worksheets belong to parts of its list', () => {
  const numbers = PRESS_PARTS.map(([number]) => number);
  for (const { part } of PRESS_WORKSHEETS) if (part !== null) expect(numbers).toContain(part);
});

test('the demo’s worksheets come to what its notes say', () => {
  // "On paper both are 1628 mm."
  const square = runWorksheet(squareWorksheet, inputsOf('square'));
  expect(square.ok && Math.round(square.value.result.diagonalMm ?? 0)).toBe(1628);
  // "35 k6: 35.002 to 35.018 mm."
  const seats = runWorksheet(seatsWorksheet, inputsOf('seats'));
  expect(seats).toMatchObject({ ok: true, value: { result: { inner: { seat: { upper: 18, lower: 2 } } } } });
  // "About 560 rpm at the drum."
  const drive = runWorksheet(driveWorksheet, inputsOf('drive'));
  expect(drive).toMatchObject({ ok: true, value: { result: { rpm: 560 } } });
  // "The cylinder came with G 3/8 ports."
  const ports = runWorksheet(portsWorksheet, inputsOf('ports'));
  expect(ports.ok && ports.value.result.candidates.map(({ name }) => name)).toEqual(['G 3/8']);
  // "pushes 86 kN at 110 bar: near enough 9 tonnes."
  const ram = runWorksheet(ramWorksheet, inputsOf('ram'));
  expect(ram.ok && Math.round(ram.value.result.extendForce.kN)).toBe(86);
});
