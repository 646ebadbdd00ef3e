import { sectionsWorksheet } from '../../../../domain/sections/sections-worksheet.ts';
import { Sheet, type SheetProps } from '../Sheet.tsx';

/** What a section weighs. */
export function SectionsSheet(props: SheetProps) {
  return (
    <Sheet {...props} sheet={sectionsWorksheet} example={{ shs: '50x3', length: '6000', quantity: '4' }} />
  );
}
