import { holesWorksheet } from '../../domain/holes/holes-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** Holes to be tapped, cleared, or pinned. */
export const holesTool = worksheetTool(holesWorksheet, {
  usage: 'holes --thread M8 | --thread M10x1.25 | --thread 1/4-20 | --bolt 12 | --clevis 16 [--transverse]',
});
