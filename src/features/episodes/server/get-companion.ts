import { and, eq, inArray, isNull } from 'drizzle-orm';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { parts } from '../../../db/schema/parts.ts';
import { readVideoAddress } from '../../../domain/video-addresses/read-video-address.ts';
import { type Database } from '../../../db/client.ts';
import { read } from '../../../server/verb.ts';
import { listShownAppearances } from '../../notes/server/list-appearances.ts';
import { listShownNotes } from '../../notes/server/list-shown-notes.ts';
import { type Companion, type CompanionVideo, type KeptVideo } from '../companion.ts';
import { type Video } from '../episode.ts';
import { getPublicEpisode } from './get-public-episode.ts';
import { listPublicEpisodes } from './list-public-episodes.ts';
import { presentCompanion } from './present-companion.ts';

interface Ref {
  readonly build: string;
  readonly number: number;
}

/**
 * All that the page of a published episode shows. `build.slug` and `episode.number` are the current ones, whatever
 * old ones were asked for.
 * @throws NotFound unless an edition of it is on show in a public build
 */
export const getCompanion = read({ may: 'published.read' }, async (context, ref: Ref): Promise<Companion> => {
  const { db, workshop } = context;
  const { build, episode, edition, chapters, of } = await getPublicEpisode(context, ref);
  const { items: notes } = await listShownNotes(context, { episodeId: episode.id });
  const { items: byHand } = await listShownAppearances(context, { episodeId: episode.id });
  const { items: published } = await listPublicEpisodes(context, { buildId: build.id });
  const partIds = new Set([...notes.flatMap((note) => note.partIds), ...byHand.map(({ partId }) => partId)]);
  const { captions, video } = edition;
  return {
    build: { id: build.id, slug: build.slug, name: build.name },
    episode: {
      id: episode.id,
      number: episode.number,
      title: episode.title,
      about: episode.about,
      publishedOn: episode.publishedOn,
    },
    video: await describeVideo(db, video),
    captions: captions && { id: captions.id, language: captions.language },
    ...presentCompanion({
      video,
      notes,
      byHand,
      chapters,
      parts: await loadShownParts(db, workshop.id, [...partIds]),
    }),
    series: published.map(({ number, title }) => ({ number, title })).sort((a, b) => a.number - b.number),
    of,
  };
});

/** A video as its page needs it. */
export async function describeVideo(db: Database, video: Video): Promise<CompanionVideo> {
  const { seconds, rate } = video;
  if (video.fileId !== null) {
    return { kept: await describeFile(db, video.fileId), elsewhere: null, seconds, rate };
  }
  // It was read when it was stored: what only tests may keep has been let in there, or not at all.
  const address = readVideoAddress(video.address ?? '', { allowLoopback: true });
  if (!address.ok) throw new Error(`The stored address of video ${video.id} cannot be read.`);
  return { kept: null, elsewhere: address.value, seconds, rate };
}

async function describeFile(db: Database, id: string): Promise<KeptVideo> {
  const rows = await db
    .select({ variant: fileVariants.variant, width: fileVariants.width, height: fileVariants.height })
    .from(files)
    .innerJoin(fileVariants, eq(fileVariants.fileId, files.id))
    .where(and(eq(files.id, id), inArray(fileVariants.variant, ['video', 'poster'])));
  const rendition = rows.find(({ variant }) => variant === 'video');
  return {
    id,
    width: rendition?.width ?? null,
    height: rendition?.height ?? null,
    hasPoster: rows.some(({ variant }) => variant === 'poster'),
  };
}

/** Those of the parts named that stand in the list. */
export function loadShownParts(db: Database, workshopId: string, ids: readonly string[]) {
  if (ids.length === 0) return Promise.resolve([]);
  return db
    .select({
      id: parts.id,
      number: parts.number,
      name: parts.name,
      kind: parts.kind,
      quantity: parts.quantity,
      material: parts.material,
      size: parts.size,
      inPlans: parts.inPlans,
    })
    .from(parts)
    .where(and(eq(parts.workshopId, workshopId), inArray(parts.id, [...ids]), isNull(parts.deletedAt)));
}
