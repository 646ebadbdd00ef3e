import { Table } from '../../../../components/Table.tsx';
import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { type RamResult, ramWorksheet } from '../../../../domain/ram/ram-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';
import { StrokePicture } from './StrokePicture.tsx';

const COLUMNS = [
  { key: 'what', label: 'What' },
  { key: 'value', label: 'Result', numeric: true },
];

const show = (value: number) => formatNumber(value, 4);

function forceRows(way: string, { kN, lbf, shortTons, longTons, tonnesForce }: RamResult['extendForce']) {
  return [
    { what: `Force ${way}`, value: `${show(kN)} kN` },
    { what: `Force ${way}, in pounds`, value: `${show(lbf)} lbf` },
    { what: `Force ${way}, in tonnes of 1000 kg`, value: show(tonnesForce) },
    { what: `Force ${way}, in short tons of 2000 lb`, value: show(shortTons) },
    { what: `Force ${way}, in long tons of 2240 lb`, value: show(longTons) },
  ];
}

function rowsOf(result: RamResult) {
  const { extendForce, retractForce, extendS, retractS, cycleS, hoseMPerS, tankLitres, engineKW } = result;
  const timed = (value: number | null, unit: string) => (value === null ? null : `${show(value)} ${unit}`);
  return [
    ...forceRows('out', extendForce),
    ...forceRows('in', retractForce),
    { what: 'Oil for a stroke', value: `${show(result.oilLitres)} L` },
    { what: 'Time out', value: timed(extendS, 's') },
    { what: 'Time back', value: timed(retractS, 's') },
    { what: 'Cycle', value: timed(cycleS, 's') },
    { what: 'Oil in the pressure hose', value: timed(hoseMPerS, 'm/s') },
    { what: 'Oil coming back', value: timed(result.returnLitresPerMinute, 'L/min') },
    { what: 'Tank, three minutes of the pump', value: timed(tankLitres, 'L') },
    { what: 'Power at the pump’s shaft, at most', value: timed(engineKW, 'kW') },
    { what: 'Buckling load over greatest force', value: timed(result.bucklingFactor, 'times') },
  ].flatMap(({ what, value }) => (value === null ? [] : [{ id: what, cells: { what, value } }]));
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
