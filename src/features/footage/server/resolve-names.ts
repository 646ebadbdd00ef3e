import { and, eq, isNull } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { cameras } from '../../../db/schema/footage.ts';
import { parts } from '../../../db/schema/parts.ts';
import { stages } from '../../../db/schema/builds.ts';
import { type Database } from '../../../db/client.ts';
import { type NamedClip } from '../../../domain/footage/named-clip.ts';
import { partNumberKey } from '../../../domain/part-numbers.ts';

/** Whose footage it is. */
export interface FootageOf {
  readonly workshopId: string;
  readonly buildId: string;
}

/** What the names in a list of clips stand for. */
export interface KnownNames {
  readonly camera: (name: string | null) => string | null;
  readonly stage: (name: string | null) => string | null;
  readonly part: (number: string) => string | null;
}

const plain = (name: string) => name.normalize('NFC').trim().toLowerCase();

/** Finds the cameras, stages and parts that a list of clips names; a camera that is not known is made. */
export async function resolveNames(
  db: Database,
  { workshopId, buildId }: FootageOf,
  list: readonly NamedClip[],
): Promise<KnownNames> {
  const wanted = new Map(list.flatMap(({ camera }) => (camera === null ? [] : [[plain(camera), camera]])));
  const loadCameras = () =>
    db
      .select({ id: cameras.id, name: cameras.name })
      .from(cameras)
      .where(and(eq(cameras.workshopId, workshopId), isNull(cameras.deletedAt)));
  let known = new Map((await loadCameras()).map(({ id, name }) => [plain(name), id]));
  const missing = [...wanted].filter(([key]) => !known.has(key));
  if (missing.length > 0) {
    await db
      .insert(cameras)
      .values(missing.map(([, name]) => ({ id: newId(), workshopId, name })))
      .onConflictDoNothing();
    known = new Map((await loadCameras()).map(({ id, name }) => [plain(name), id]));
  }
  const stageRows = await db
    .select({ id: stages.id, name: stages.name })
    .from(stages)
    .where(and(eq(stages.workshopId, workshopId), eq(stages.buildId, buildId), isNull(stages.deletedAt)));
  const partRows = await db
    .select({ id: parts.id, number: parts.number })
    .from(parts)
    .where(and(eq(parts.workshopId, workshopId), eq(parts.buildId, buildId), isNull(parts.deletedAt)));
  const stageIds = new Map(stageRows.map(({ id, name }) => [plain(name), id]));
  const partIds = new Map(partRows.map(({ id, number }) => [partNumberKey(number), id]));
  return {
    camera: (name) => (name === null ? null : (known.get(plain(name)) ?? null)),
    stage: (name) => (name === null ? null : (stageIds.get(plain(name)) ?? null)),
    part: (number) => partIds.get(partNumberKey(number)) ?? null,
  };
}
