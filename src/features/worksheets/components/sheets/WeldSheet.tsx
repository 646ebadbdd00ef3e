import { weldWorksheet } from '../../../../domain/weld/weld-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

/** Stick welding: current, throat, least leg against cracking, electrodes, heat. */
export function WeldSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={weldWorksheet}
      example={{ electrode: 'E7018', diameter: '3.2', leg: '5', length: '400', thickness: '10', other: '12' }}
      picture={({ result: { currentA } }) =>
        currentA !== null && (
          <p>
            <strong>Current:</strong>{' '}
            <span className="font-mono">
              {currentA[0]} to {currentA[1]} A
            </span>
            , by this electrode and diameter; the box of the maker comes first.
          </p>
        )
      }
    />
  );
}
