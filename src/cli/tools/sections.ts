import { sectionsWorksheet } from '../../domain/sections/sections-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** What a section weighs by the metre, and a length of it. */
export const sectionsTool = worksheetTool(sectionsWorksheet, {
  usage:
    'sections --flat 50x12 | --round 30 | --shs 50x3 | --rhs 100x50x4 | --angle 50x5 | --pipe 48.3x3.2 [--length 6000] [--quantity 4] [--density 7850] [--finish cold|hot|sharp]',
  present: ({ result: { kgPerM, kg } }) => (kg === null ? { kgPerM } : { kgPerM, kg }),
});
