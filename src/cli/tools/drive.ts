import { driveWorksheet } from '../../domain/drive/drive-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** Speeds and ratios. */
export const driveTool = worksheetTool(driveWorksheet, {
  usage:
    'drive --rpm 1440 --driver 80 --driven 240 [--driver2 60 --driven2 180] [--centres 400] [--diameter 300] [--cutting "25 m/min"]',
});
