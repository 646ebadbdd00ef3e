import { type Answer, right, wrong } from '../../domain/answer.ts';
import { type Tool } from '../tool.ts';
import { beamTool } from './beam.ts';
import { captionsTool } from './captions.ts';
import { chaptersTool } from './chapters.ts';
import { driveTool } from './drive.ts';
import { editTool } from './edit.ts';
import { fitTool, seatsTool } from './fit.ts';
import { holesTool } from './holes.ts';
import { lengthTool } from './length.ts';
import { placeTool } from './place.ts';
import { portsTool } from './ports.ts';
import { ramTool } from './ram.ts';
import { scheduleTool } from './schedule.ts';
import { sectionsTool } from './sections.ts';
import { squareTool } from './square.ts';
import { stockTool } from './stock.ts';
import { timecodeTool } from './timecode.ts';
import { weldTool } from './weld.ts';

/** The tools by the name they are called by. */
export const TOOLS: ReadonlyMap<string, Tool> = new Map([
  ['beam', beamTool],
  ['captions', captionsTool],
  ['chapters', chaptersTool],
  ['drive', driveTool],
  ['edit', editTool],
  ['fit', fitTool],
  ['holes', holesTool],
  ['length', lengthTool],
  ['place', placeTool],
  ['ports', portsTool],
  ['ram', ramTool],
  ['schedule', scheduleTool],
  ['seats', seatsTool],
  ['sections', sectionsTool],
  ['square', squareTool],
  ['stock', stockTool],
  ['timecode', timecodeTool],
  ['weld', weldTool],
]);

/** A tool by its name, or the sentence for a name that has none. */
export function findTool(name: unknown): Answer<Tool> {
  const known = [...TOOLS.keys(), 'batch'].join(', ');
  if (typeof name !== 'string' || name === '') return wrong(`Say which tool: ${known}.`);
  const tool = TOOLS.get(name);
  return tool === undefined
    ? wrong(`There is no tool ${name.slice(0, 40)} here. There are: ${known}.`)
    : right(tool);
}
