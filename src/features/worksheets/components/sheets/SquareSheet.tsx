import { squareWorksheet } from '../../../../domain/square/square-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

/** Square and angle. */
export function SquareSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={squareWorksheet}

      example={{ width: '800', height: '1200', diagonal: '1443', other: '1441' }}
    />
  );
}
