import { beamWorksheet } from '../../domain/beam/beam-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** Simple beams and cantilevers. */
export const beamTool = worksheetTool(beamWorksheet, {
  usage:
    'beam --case simple-centre|simple-uniform|cantilever-end|cantilever-uniform --span 1200 --load "2 kN" --bar 12x50 | --round 30 | --shs 50x3 | --rhs 100x50x4 | --pipe 48.3x3.2 [--modulus "210 GPa"] [--yield "235 MPa"]',
});
