import { type ComponentType } from 'react';
import { type SheetId } from '../worksheet.ts';
import { type SheetProps } from './Sheet.tsx';
import { BeamSheet } from './sheets/BeamSheet.tsx';
import { DriveSheet } from './sheets/DriveSheet.tsx';
import { FitsSheet } from './sheets/FitsSheet.tsx';
import { HolesSheet } from './sheets/HolesSheet.tsx';
import { LengthsSheet } from './sheets/LengthsSheet.tsx';
import { PortsSheet } from './sheets/PortsSheet.tsx';
import { RamSheet } from './sheets/RamSheet.tsx';
import { SeatsSheet } from './sheets/SeatsSheet.tsx';
import { SectionsSheet } from './sheets/SectionsSheet.tsx';
import { SquareSheet } from './sheets/SquareSheet.tsx';
import { WeldSheet } from './sheets/WeldSheet.tsx';

const SHEETS: Readonly<Record<SheetId, ComponentType<SheetProps>>> = {
  lengths: LengthsSheet,
  holes: HolesSheet,
  fits: FitsSheet,
  seats: SeatsSheet,
  sections: SectionsSheet,
  ports: PortsSheet,
  drive: DriveSheet,
  square: SquareSheet,
  ram: RamSheet,
  weld: WeldSheet,
  beam: BeamSheet,
};

/** The worksheet of an id. */
export function AnySheet({ id, ...props }: SheetProps & { readonly id: SheetId }) {
  const Found = SHEETS[id];
  return <Found {...props} />;
}
