import { beamWorksheet } from '../../domain/beam/beam-worksheet.ts';
import { driveWorksheet } from '../../domain/drive/drive-worksheet.ts';
import { fitWorksheet } from '../../domain/fits/fit-worksheet.ts';
import { seatsWorksheet } from '../../domain/fits/seats-worksheet.ts';
import { holesWorksheet } from '../../domain/holes/holes-worksheet.ts';
import { lengthsWorksheet } from '../../domain/lengths/lengths-worksheet.ts';
import { portsWorksheet } from '../../domain/ports/ports-worksheet.ts';
import { ramWorksheet } from '../../domain/ram/ram-worksheet.ts';
import { sectionsWorksheet } from '../../domain/sections/sections-worksheet.ts';
import { squareWorksheet } from '../../domain/square/square-worksheet.ts';
import { weldWorksheet } from '../../domain/weld/weld-worksheet.ts';
import {
  type Field,
  runWorksheet,
  type Worksheet,
  type WorkingStep,
} from '../../domain/worksheets/worksheet.ts';
import { toGiven } from './given.ts';
import { type KeptWorksheet, type SheetId } from './worksheet.ts';

type Fields = Readonly<Record<string, Field<unknown>>>;

/** The lines of working of some inputs; none where they cannot be worked out. */
function linesOf<Inputs extends Fields>(
  sheet: Worksheet<Inputs, unknown>,
  typed: KeptWorksheet['inputs'],
): readonly WorkingStep[] {
  const worked = runWorksheet(sheet, toGiven(typed, sheet.inputs));
  return worked.ok ? worked.value.working : [];
}

const LINES: Readonly<Record<SheetId, (typed: KeptWorksheet['inputs']) => readonly WorkingStep[]>> = {
  lengths: (typed) => linesOf(lengthsWorksheet, typed),
  holes: (typed) => linesOf(holesWorksheet, typed),
  fits: (typed) => linesOf(fitWorksheet, typed),
  seats: (typed) => linesOf(seatsWorksheet, typed),
  sections: (typed) => linesOf(sectionsWorksheet, typed),
  ports: (typed) => linesOf(portsWorksheet, typed),
  drive: (typed) => linesOf(driveWorksheet, typed),
  square: (typed) => linesOf(squareWorksheet, typed),
  ram: (typed) => linesOf(ramWorksheet, typed),
  weld: (typed) => linesOf(weldWorksheet, typed),
  beam: (typed) => linesOf(beamWorksheet, typed),
};

/** The results of a kept worksheet, each by what it is called; two of one name are told apart by their order. */
export function workOut({
  sheet,
  inputs,
}: Pick<KeptWorksheet, 'sheet' | 'inputs'>): ReadonlyMap<string, string> {
  const results = new Map<string, string>();
  for (const { what, value } of LINES[sheet](inputs)) {
    let name = what;
    for (let count = 2; results.has(name); count += 1) name = `${what}, ${String(count)}`;
    results.set(name, value);
  }
  return results;
}
