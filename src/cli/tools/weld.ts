import { weldWorksheet } from '../../domain/weld/weld-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** Stick welding of a fillet. */
export const weldTool = worksheetTool(weldWorksheet, {
  usage:
    'weld --electrode E7018 --diameter 3.2 --leg 5 --length 400 --thickness 10 --other 12 [--cyclic] [--efficiency 0.62] [--rod 350] [--volts 25 --amps 120 --speed 150]',
});
