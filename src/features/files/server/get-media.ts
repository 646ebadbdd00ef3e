import { and, eq, sql } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { memberships } from '../../../db/schema/workshops.ts';
import { type Context } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { type Media } from '../../../server/http/media-answer.ts';
import { keyOf } from '../../../server/storage/storage.ts';
import { read } from '../../../server/verb.ts';
import { isShownToEveryone } from './shown-files.ts';

/** What everyone may have of a file that is shown: never the original. */
const FOR_EVERYONE = ['video', 'sound', 'poster', 'thumb', 'medium', 'large', 'filmstrip'];

/** What is looked at in the page; everything else is saved. */
const STREAMED = ['poster', 'thumb', 'medium', 'large', 'filmstrip', 'waveform'];

/**
 * One kept form of a file, for whoever may have it: the team, or everyone once it is shown to everyone.
 * @throws NotFound for anything else, without telling which
 */
export const getMedia = read(
  { may: 'media.ask' },
  async (context, { file, variant }: { file: string; variant: string }): Promise<Media> => {
    const found = await findVariant(context, file, variant);
    if (!found) throw new NotFound('This file');
    const { actor } = context;
    const isShown = found.isShown && FOR_EVERYONE.includes(variant);
    const isTeam =
      found.role !== null && (found.role !== 'owner' || (actor.kind === 'account' && actor.secondFactor));
    if (!isShown && !(isTeam && !found.isDeleted)) throw new NotFound('This file');
    return {
      key: keyOf(found.workshopId, file, variant),
      tag: `${file}-${variant}`,
      contentType: found.contentType,
      bytes: found.bytes,
      isPublic: isShown,
      way: STREAMED.includes(variant) ? 'streamed' : variant === 'document' ? 'attached' : 'elsewhere',
      saveAs: ['original', 'document'].includes(variant) ? found.name : null,
    };
  },
);

async function findVariant({ db, actor, now }: Context, file: string, variant: string) {
  const [row] = await db
    .select({
      workshopId: files.workshopId,
      name: files.name,
      contentType: fileVariants.contentType,
      bytes: fileVariants.bytes,
      isShown: sql<boolean>`coalesce(${isShownToEveryone(db, now)}, false)`,
      isDeleted: sql<boolean>`${files.deletedAt} is not null or ${builds.deletedAt} is not null`,
      role: memberships.role,
    })
    .from(files)
    .innerJoin(builds, eq(builds.id, files.buildId))
    .innerJoin(fileVariants, and(eq(fileVariants.fileId, files.id), eq(fileVariants.variant, variant)))
    .leftJoin(
      memberships,
      and(
        eq(memberships.workshopId, files.workshopId),
        actor.kind === 'account' ? eq(memberships.accountId, actor.id) : sql`false`,
      ),
    )
    .where(eq(files.id, file));
  return row;
}
