import { BadRequest, Invalid } from '../errors.ts';
import { readMultipart } from './multipart-body.ts';

export interface RequestBody {
  readonly kind: 'json' | 'form' | 'none';
  readonly values: Readonly<Record<string, unknown>>;
}

/**
 * Reads a body as a record of values, once.
 * @throws BadRequest when it is neither JSON nor a plain form, or not what it says
 */
export async function readBody(request: Request): Promise<RequestBody> {
  const type = request.headers.get('content-type')?.split(';')[0]?.trim().toLowerCase() ?? '';
  if (type === 'application/x-www-form-urlencoded')
    return { kind: 'form', values: formValues(await request.text()) };
  if (type === 'multipart/form-data') return { kind: 'form', values: await readMultipart(request) };
  if (type === 'application/json') return { kind: 'json', values: jsonValues(await request.text()) };
  if ((await request.text()) === '') return { kind: 'none', values: {} };
  throw new BadRequest('Send a form or JSON. Nothing was changed.');
}

/**
 * Refuses text that cannot be kept as it was sent: PostgreSQL takes no NUL, and half a surrogate pair is no character.
 * @throws Invalid at the field
 */
export function requireWholeText(values: Readonly<Record<string, unknown>>): void {
  for (const [field, value] of Object.entries(values)) {
    const waiting: unknown[] = [value];
    // Without recursion: a body may be nested as deep as it is long.
    while (waiting.length > 0) {
      const one = waiting.pop();
      if (typeof one === 'string' && /[\0\p{Surrogate}]/u.test(one))
        throw new Invalid({ [field]: 'There is a character in it that cannot be kept. Type it again.' });
      if (typeof one === 'object' && one !== null)
        for (const [key, inner] of Object.entries(one)) waiting.push(key, inner);
    }
  }
}

function jsonValues(text: string): Record<string, unknown> {
  try {
    const value: unknown = JSON.parse(text);
    if (typeof value === 'object' && value !== null && !Array.isArray(value))
      return value as Record<string, unknown>;
  } catch {
    // Said below, in one sentence for all that is not an object.
  }
  throw new BadRequest('The body is not a JSON object. Nothing was changed.');
}

function formValues(text: string): Record<string, unknown> {
  const form = new URLSearchParams(text);
  return Object.fromEntries(
    [...new Set(form.keys())].map((key) => {
      const all = form.getAll(key);
      return [key, all.length > 1 ? all : all[0]];
    }),
  );
}
