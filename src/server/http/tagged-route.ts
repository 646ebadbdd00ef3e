import { type APIContext } from 'astro';
import { type Ruled } from '../verb.ts';
import { type RuledRoute } from './api-route.ts';
import { contextOf } from './request-context.ts';

/**
 * A read that is asked again and again while something is going on: who has the newest answer gets 304 for the
 * price of its tag.
 * @param tag gives what changes exactly when the answer does, from the path's parameters; its rule is the read's
 */
export function taggedRoute<Params>(route: RuledRoute, tag: Ruled<Params, string>): RuledRoute {
  async function handle(context: APIContext): Promise<Response> {
    const current = await currentTag(context, tag);
    if (current !== null && context.request.headers.get('if-none-match') === current)
      return new Response(null, { status: 304, headers: { etag: current, 'cache-control': 'no-store' } });
    const answer = await route(context);
    if (answer.ok && current !== null) answer.headers.set('etag', current);
    return answer;
  }
  return Object.assign(handle, { route: route.route });
}

/** Null where the read itself has to say what is wrong. */
async function currentTag<Params>(context: APIContext, tag: Ruled<Params, string>): Promise<string | null> {
  try {
    const asked = await contextOf(context.locals.parts, context.params['workshop'] ?? null);
    return `"${await tag(asked, context.params as Params)}"`;
  } catch {
    return null;
  }
}
