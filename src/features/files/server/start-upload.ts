import { and, desc, eq, isNull } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { files } from '../../../db/schema/files.ts';
import { sayBytes } from '../../../domain/byte-sizes.ts';
import { Invalid } from '../../../server/errors.ts';
import { type Settings } from '../../../server/env.ts';
import { incomingKey } from '../../../server/storage/storage.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { partBytesFor, type StartedUpload, type StartUpload } from '../file.ts';
import { lockQuota, measureStorage } from './measure-storage.ts';

/**
 * Announces a file; or finds the unfinished upload of the same one, so that only what is missing is sent.
 * @throws Invalid when it is larger than a file may be, or than what is left of the workshop's space
 */
export const startUpload = verb(
  { may: 'footage.change' },
  async (context, input: StartUpload & { build: string }): Promise<StartedUpload> => {
    const { db, workshop, actor, services } = context;
    const build = await loadBuild(context, input.build);
    await lockQuota(db, workshop.id);
    const same = await findUnfinished(context, build.id, input);
    if (same) return present(same.id, input.bytes, true);
    await requireSpace(context, input.bytes, services.settings);
    const id = newId();
    const uploadId = await services.storage.uploads.begin(
      incomingKey(workshop.id, id),
      'application/octet-stream',
    );
    await db.insert(files).values({
      id,
      workshopId: workshop.id,
      buildId: build.id,
      purpose: input.purpose,
      name: input.name,
      bytes: input.bytes,
      fingerprint: input.fingerprint,
      uploadId,
      addedBy: actor.kind === 'account' ? actor.id : null,
    });
    return present(id, input.bytes, false);
  },
);

type StartContext = Parameters<Parameters<typeof verb<'footage.change', never, never>>[1]>[0];

async function findUnfinished({ db, workshop }: StartContext, buildId: string, input: StartUpload) {
  const [row] = await db
    .select({ id: files.id })
    .from(files)
    .where(
      and(
        eq(files.workshopId, workshop.id),
        eq(files.buildId, buildId),
        eq(files.state, 'uploading'),
        eq(files.purpose, input.purpose),
        eq(files.name, input.name),
        eq(files.bytes, input.bytes),
        eq(files.fingerprint, input.fingerprint),
        isNull(files.deletedAt),
      ),
    )
    .orderBy(desc(files.id))
    .limit(1);
  return row;
}

async function requireSpace(
  { db, workshop }: StartContext,
  bytes: number,
  { UPLOAD_MAX, WORKSHOP_QUOTA }: Pick<Settings, 'UPLOAD_MAX' | 'WORKSHOP_QUOTA'>,
): Promise<void> {
  if (bytes > UPLOAD_MAX) {
    throw new Invalid({
      bytes: `The file is ${sayBytes(bytes)}; at most ${sayBytes(UPLOAD_MAX)} is taken. Nothing was sent. Cut it in two, or export it smaller.`,
    });
  }
  const { kept, announced } = await measureStorage(db, workshop.id);
  const left = Math.max(0, WORKSHOP_QUOTA - kept - announced);
  if (bytes > left) {
    throw new Invalid({
      bytes: `The file is ${sayBytes(bytes)}, and ${sayBytes(left)} of this workshop's space is left. Nothing was sent. Make room on the storage page, then choose it again.`,
    });
  }
}

function present(id: string, bytes: number, resumed: boolean): StartedUpload {
  return { id, bytes, partBytes: partBytesFor(bytes), resumed };
}
