import { and, eq, inArray, isNull } from 'drizzle-orm';
import { fileVariants } from '../../../db/schema/files.ts';
import { notes } from '../../../db/schema/notes.ts';
import { type Database } from '../../../db/client.ts';
import { paths } from '../../../paths.ts';
import { type Feed } from '../../../server/feeds/write-feed.ts';
import { read } from '../../../server/verb.ts';
import { getPublicBuild } from '../../builds/server/get-public-build.ts';
import { type Note } from '../../notes/note.ts';
import { findShownViews, shownToViewers } from '../../notes/server/episode-view.ts';
import { loadNotes } from '../../notes/server/load-notes.ts';
import { listPublicEpisodes } from './list-public-episodes.ts';
import { describeInFeed, feedInstant } from './present-feed-item.ts';

/** How many episodes a feed tells, from the newest on. */
const MOST_ITEMS = 50;

/**
 * The feed of a workshop, or of one of its builds: its path, what it says and the tags of what it shows. The path is
 * the current one, whatever old name was asked for.
 * @throws NotFound for a build that is not on show
 */
export const getFeed = read(
  { may: 'published.read' },
  async (
    context,
    input: { readonly build?: string },
  ): Promise<{ readonly path: string; readonly tags: readonly string[]; readonly feed: Feed }> => {
    const { db, workshop, services } = context;
    const site = services.settings.PUBLIC_URL;
    const build = input.build === undefined ? null : await getPublicBuild(context, { build: input.build });
    const { items } = await listPublicEpisodes(context, {
      limit: MOST_ITEMS,
      ...(build && { buildId: build.id }),
    });
    const ids = items.map(({ id }) => id);
    const notesOf = await loadShownNotes(db, workshop.id, ids);
    const lengthOf = await loadLengths(
      db,
      items.flatMap(({ video }) => video.fileId ?? []),
    );
    const path =
      build === null ? paths.workshopFeed(workshop.slug) : paths.buildFeed(workshop.slug, build.slug);
    return {
      path,
      tags: [`workshop:${workshop.id}`, ...items.map((item) => `build:${item.build.id}`)].concat(
        build === null ? [] : `build:${build.id}`,
      ),
      feed: {
        title: build === null ? workshop.name : `${build.name}, ${workshop.name}`,
        description: build?.about || `New episodes of ${build?.name ?? workshop.name}`,
        link:
          site + (build === null ? paths.workshop(workshop.slug) : paths.build(workshop.slug, build.slug)),
        self: site + path,
        language: workshop.language,
        items: items.map(({ id, number, title, about, publishedOn, edition, video, ...item }) => {
          const link = site + paths.episode(workshop.slug, item.build.slug, number);
          const length = video.fileId === null ? undefined : lengthOf.get(video.fileId);
          return {
            id,
            title,
            link,
            publishedAt: feedInstant(publishedOn, edition.publishedAt),
            html: describeInFeed(about, notesOf.get(id) ?? [], video.rate, link),
            // Only of a file kept here: of one elsewhere nobody knows the length, or that it is a file at all.
            enclosure:
              video.fileId === null || length === undefined
                ? null
                : { url: site + paths.media(video.fileId, 'video'), length, type: 'video/mp4' },
          };
        }),
      },
    };
  },
);

/** What viewers see of several episodes' notes, by episode. */
async function loadShownNotes(
  db: Database,
  workshopId: string,
  episodeIds: readonly string[],
): Promise<Map<string, Note[]>> {
  if (episodeIds.length === 0) return new Map();
  const views = await findShownViews(db, episodeIds);
  const byEpisode = new Map<string, Note[]>();
  for (const [episodeId, view] of views) {
    const shown = and(
      shownToViewers(view),
      isNull(notes.deletedAt),
      eq(notes.workshopId, workshopId),
      eq(notes.audience, 'viewers'),
      eq(notes.proposed, false),
    );
    byEpisode.set(episodeId, await loadNotes(db, view, shown));
  }
  return byEpisode;
}

/** Bytes of the renditions that viewers get, by file. */
async function loadLengths(db: Database, fileIds: readonly string[]): Promise<Map<string, number>> {
  if (fileIds.length === 0) return new Map();
  const rows = await db
    .select({ fileId: fileVariants.fileId, bytes: fileVariants.bytes })
    .from(fileVariants)
    .where(and(inArray(fileVariants.fileId, [...fileIds]), eq(fileVariants.variant, 'video')));
  return new Map(rows.map(({ fileId, bytes }) => [fileId, bytes]));
}
