import { portsWorksheet } from '../../domain/ports/ports-worksheet.ts';
import { worksheetTool } from '../worksheet-tool.ts';

/** Which thread this is. */
export const portsTool = worksheetTool(portsWorksheet, {
  usage: 'ports --diameter 16.6 [--pitch "19 tpi"] [--side external|internal] [--taper yes|no]',
});
