import { type Edit } from '../../../domain/edit/edit.ts';
import { whyNoEdl, writeEdl } from '../../../domain/edit/write-edl.ts';
import { writeOtio } from '../../../domain/edit/write-otio.ts';
import { writeMarksCsv } from '../../../domain/marks/write-marks-csv.ts';
import { Invalid } from '../../../server/errors.ts';
import { type TextFile } from '../../../server/http/text-file.ts';
import { type EditFileForm } from '../edit.ts';

/**
 * An edit as a file. @param name without its ending
 * @throws Invalid for a list that cannot be written
 */
export function writeEditFile(name: string, edit: Edit, as: EditFileForm): TextFile {
  if (as === 'otio') return { name: `${name}.otio`, type: 'application/json', text: writeOtio(edit) };
  const no = whyNoEdl(edit);
  if (no !== null) throw new Invalid({ as: no });
  if (as === 'csv') return { name: `${name}.csv`, type: 'text/csv', text: writeMarksCsv(edit) };
  return { name: `${name}.edl`, type: 'text/plain', text: writeEdl(edit, edit.drop) };
}
