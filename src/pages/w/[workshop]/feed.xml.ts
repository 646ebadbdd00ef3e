import { type APIRoute } from 'astro';
import { getFeed } from '../../../features/episodes/server/get-feed.ts';
import { writeFeed } from '../../../server/feeds/write-feed.ts';
import { keptAnswer, publicContext } from '../../../server/http/public-answer.ts';

/** The episodes of a workshop as they come out, for readers of every make. */
export const GET: APIRoute = async ({ params, locals, url }) => {
  const context = await publicContext(locals, params['workshop']);
  const { path, tags, feed } = await getFeed(context, {});
  if (path !== url.pathname) return new Response(null, { status: 308, headers: { location: path } });
  return keptAnswer(await writeFeed(feed), 'application/rss+xml; charset=utf-8', tags);
};
