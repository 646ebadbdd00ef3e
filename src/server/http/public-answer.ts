import { type WorkshopContext } from '../context.ts';
import { NotFound } from '../errors.ts';
import { contextOf } from './request-context.ts';
import { PAGE_TAGS_HEADER } from './response-guard.ts';

/** The context of an endpoint among the public pages. @throws NotFound when there is no such workshop */
export async function publicContext(
  locals: App.Locals,
  workshop: string | undefined,
): Promise<WorkshopContext> {
  const context = await contextOf(locals.parts, workshop ?? '');
  if (context.workshop === null) throw new NotFound('This workshop');
  return { ...context, workshop: context.workshop };
}

/**
 * An answer that is no page, which the front server keeps like one until one of its tags moves.
 * @param contentType with its charset
 */
export function keptAnswer(body: string, contentType: string, tags: readonly string[]): Response {
  return new Response(body, { headers: { 'content-type': contentType, [PAGE_TAGS_HEADER]: tags.join(',') } });
}
