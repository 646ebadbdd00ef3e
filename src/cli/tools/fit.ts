import { fitWorksheet } from '../../domain/fits/fit-worksheet.ts';
import { type Deviations } from '../../domain/fits/iso-286.ts';
import { seatsWorksheet } from '../../domain/fits/seats-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

const pair = ({ lower, upper }: Deviations) => [lower, upper];

/** Limits and fits in micrometres, each as [lower, upper], the clearance as [least, most]. */
export const fitTool = worksheetTool(fitWorksheet, {
  usage: 'fit --size 25 [--hole H7] [--shaft k6] [--measured 25.31 --instrument 0.01 --dial diameter|radius]',
  present: ({ result: { hole, shaft, fit, takeOff } }) => ({
    ...(hole === null ? {} : { hole: pair(hole) }),
    ...(shaft === null ? {} : { shaft: pair(shaft) }),
    ...(fit === null ? {} : { clearance: [fit.least, fit.most], fit: fit.kind }),
    ...(takeOff === null ? {} : { takeOff }),
  }),
});

/** Both seats of a bearing. */
export const seatsTool = worksheetTool(seatsWorksheet, {
  usage: 'seats --bore 25 --outside 52 --shaft k6 --housing H7 --turning inner|outer',
});
