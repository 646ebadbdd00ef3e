import { driveWorksheet } from '../../../../domain/drive/drive-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

/** Drives and speeds. */
export function DriveSheet(props: SheetProps) {
  return (
    <Sheet
      {...props}
      sheet={driveWorksheet}

      example={{ rpm: '1440', driver: '80', driven: '240', centres: '400', diameter: '300' }}
    />
  );
}
