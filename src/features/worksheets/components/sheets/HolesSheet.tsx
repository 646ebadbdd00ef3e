import { Table } from '../../../../components/Table.tsx';
import { type HolesResult, holesWorksheet } from '../../../../domain/holes/holes-worksheet.ts';
import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

function rowsOf({ thread, tappingDrill, tappingDrillMm, clearanceMm, splitPin }: HolesResult) {
  const mm = (value: number) => `${formatNumber(value)} mm`;
  return [
    ...(tappingDrillMm === null
      ? []
      : [
          {
            what: `Tapping drill for ${thread ?? 'it'}`,
            value: tappingDrill === null ? mm(tappingDrillMm) : `${tappingDrill}, ${mm(tappingDrillMm)}`,
          },
        ]),
    ...(clearanceMm === null
      ? []
      : [
          { what: 'Clearance hole, close', value: mm(clearanceMm.fine) },
          { what: 'Clearance hole, medium', value: mm(clearanceMm.medium) },
          { what: 'Clearance hole, free', value: mm(clearanceMm.coarse) },
        ]),
    ...(splitPin === null
      ? []
      : [
          { what: 'Split pin, nominal', value: mm(splitPin.nominal) },
          { what: 'Hole for it', value: mm(splitPin.holeMm) },
          { what: 'Its shank', value: `${formatNumber(splitPin.shankMm[0])} to ${mm(splitPin.shankMm[1])}` },
        ]),
  ].map((cells) => ({ id: cells.what, cells }));
}

const COLUMNS = [
  { key: 'what', label: 'Hole' },
  { key: 'value', label: 'Size', numeric: true },
];

/** Holes to be tapped, cleared or pinned. */
export function HolesSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={holesWorksheet}

      example={{ thread: 'M12' }}
      picture={({ result }) => <Table caption="Holes" hideCaption columns={COLUMNS} rows={rowsOf(result)} />}
    />
  );
}
