import { squareWorksheet } from '../../domain/square/square-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** Angles and diagonals. */
export const squareTool = worksheetTool(squareWorksheet, {
  usage:
    'square --over 1000 --offset 35 | --over 1000 --angle 2 | --width 800 --height 1200 [--diagonal 1443 --other 1441]',
});
