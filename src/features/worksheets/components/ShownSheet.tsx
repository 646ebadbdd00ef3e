import { type SheetId } from '../worksheet.ts';
import { AnySheet } from './AnySheet.tsx';
import { type Typed } from '../given.ts';

/** A kept worksheet for reading: the inputs as its maker typed them, and what comes out. */
export function ShownSheet({ id, typed }: { readonly id: SheetId; readonly typed: Typed }) {
  return <AnySheet id={id} typed={typed} reading />;
}
