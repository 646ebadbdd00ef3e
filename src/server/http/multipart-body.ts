import { BadRequest } from '../errors.ts';
import { UploadedFile } from './uploaded-file.ts';

/**
 * Reads a form that may bring small files, all of it in memory: the front server has limited its size by its path.
 * Fields are texts, files are `UploadedFile`; a file field that was left empty is left out.
 * @throws BadRequest when it is cut off or not such a form
 */
export async function readMultipart(request: Request): Promise<Record<string, unknown>> {
  let form: FormData;
  try {
    form = await request.formData();
  } catch {
    throw new BadRequest('The form did not arrive whole. Nothing was changed; send it again.');
  }
  const values: Record<string, unknown> = {};
  for (const [name, value] of form) {
    if (typeof value === 'string') values[name] = value;
    else if (value.size > 0 || value.name !== '')
      values[name] = new UploadedFile(value.name, new Uint8Array(await value.arrayBuffer()));
  }
  return values;
}
