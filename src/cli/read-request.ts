import { type z } from 'zod';
import { type Answer, right, wrong } from '../domain/answer.ts';
import { type Request } from './tool.ts';

/** A request as its tool needs it; the error is the schema's own sentence for the first field that is wrong. */
export function readRequest<Schema extends z.ZodType>(
  schema: Schema,
  request: Request,
): Answer<z.output<Schema>> {
  const read = schema.safeParse(request);
  if (read.success) return right(read.data);
  const [issue] = read.error.issues;
  return wrong(issue?.message ?? 'The request is not understood.');
}
