import { ramWorksheet } from '../../domain/ram/ram-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** What a cylinder and its pump do. */
export const ramTool = worksheetTool(ramWorksheet, {
  usage:
    'ram --bore 100 --rod 45 --stroke 600 --pressure "2500 psi" [--pump "11 gpm@650psi,3 gpm@2500psi"] [--pressing 80] [--efficiency 0.85] [--hose 12.7] [--hoserating "275 bar"] [--engine "4 kW" --rating continuous|peak] [--extended 1300 --mounting pinned|fixed-pinned|fixed-fixed|fixed-free]',
});
