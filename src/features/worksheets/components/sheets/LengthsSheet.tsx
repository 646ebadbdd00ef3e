import { lengthsWorksheet } from '../../../../domain/lengths/lengths-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

/** A length in both systems. */
export function LengthsSheet(props: SheetProps) {
  return <Sheet {...props} sheet={lengthsWorksheet} example={{ text: '1-1/2 in' }} />;
}
