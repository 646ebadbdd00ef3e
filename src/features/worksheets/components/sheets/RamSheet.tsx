import { Table } from '../../../../components/Table.tsx';
import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { type RamResult, ramWorksheet } from '../../../../domain/ram/ram-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';
import { StrokePicture } from './StrokePicture.tsx';

const COLUMNS = [
  { key: 'what', label: 'What' },
  { key: 'value', label: 'Result', numeric: true },
];

function sayForce({ kN, lbf, shortTons, longTons, tonnesForce }: RamResult['extendForce']): string {
  const show = (value: number) => formatNumber(value, 4);
  return `${show(kN)} kN · ${show(lbf)} lbf · ${show(tonnesForce)} tonnes · ${show(shortTons)} short tons · ${show(longTons)} long tons`;
}

function rowsOf(result: RamResult) {
  const { extendForce, retractForce, extendS, retractS, cycleS, hoseMPerS, tankLitres, engineKW } = result;
  const show = (value: number) => formatNumber(value, 4);
  const timed = (value: number | null, unit: string) => (value === null ? null : `${show(value)} ${unit}`);
  return [
    { what: 'Force out', value: sayForce(extendForce) },
    { what: 'Force in', value: sayForce(retractForce) },
    { what: 'Oil for a stroke', value: `${show(result.oilLitres)} L` },
    { what: 'Time out', value: timed(extendS, 's') },
    { what: 'Time back', value: timed(retractS, 's') },
    { what: 'Cycle', value: timed(cycleS, 's') },
    { what: 'Oil in the pressure hose', value: timed(hoseMPerS, 'm/s') },
    { what: 'Oil coming back', value: timed(result.returnLitresPerMinute, 'L/min') },
    { what: 'Tank, three minutes of the pump', value: timed(tankLitres, 'L') },
    { what: 'Power at the pump’s shaft, at most', value: timed(engineKW, 'kW') },
    { what: 'Buckling load over greatest force', value: timed(result.bucklingFactor, '') },
  ].flatMap(({ what, value }) =>
    value === null ? [] : [{ id: what, cells: { what, value: value.trim() } }],
  );
}

/** A hydraulic ram with its pump. */
export function RamSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={ramWorksheet}
      example={{
        bore: '100',
        rod: '45',
        stroke: '600',
        pressure: '2500 psi',
        pump: '11 gpm@650 psi, 3 gpm@2500 psi',
        pressing: '80',
      }}
      picture={({ result }, typed) => (
        <>
          <StrokePicture result={result} typed={typed} />
          <Table caption="Force, time and oil" hideCaption columns={COLUMNS} rows={rowsOf(result)} />
        </>
      )}
    />
  );
}
