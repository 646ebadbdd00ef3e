import { and, eq, isNull, sql } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { read } from '../../../server/verb.ts';
import { couldDropOriginal } from '../file.ts';
import { measureStorage } from './measure-storage.ts';

/** What is kept of one build, in bytes. */
export interface MeasuredBuild {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly files: number;
  readonly bytes: number;
  readonly byKind: Readonly<Record<string, number>>;
  /** Originals that something stands in for. */
  readonly droppable: { readonly files: number; readonly bytes: number };
  /** Of files that were deleted and can still be brought back. */
  readonly deleted: number;
}

/** Where a workshop's space went: by build and by kind, from the sizes of what is really kept. */
export const measureBuilds = read({ may: 'workshop.see-bench' }, async ({ db, workshop, services }) => {
  const rows = await db
    .select({
      build: builds.id,
      slug: buildSlugs.slug,
      name: builds.name,
      file: files.id,
      state: files.state,
      kind: files.kind,
      originalKept: files.originalKept,
      deleted: sql<boolean>`${files.deletedAt} is not null`,
      variants: sql<
        string[]
      >`coalesce(array_agg(${fileVariants.variant}) filter (where ${fileVariants.variant} is not null), '{}')`,
      bytes: sql<string>`coalesce(sum(${fileVariants.bytes}), 0)`,
      originalBytes: sql<string>`coalesce(sum(${fileVariants.bytes}) filter (where ${fileVariants.variant} = 'original'), 0)`,
    })
    .from(builds)
    .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
    .leftJoin(files, eq(files.buildId, builds.id))
    .leftJoin(fileVariants, eq(fileVariants.fileId, files.id))
    .where(and(eq(builds.workshopId, workshop.id), isNull(builds.deletedAt)))
    .groupBy(builds.id, buildSlugs.slug, files.id)
    .orderBy(builds.id);
  const measured = new Map<string, MeasuredBuild>();
  for (const row of rows) {
    const before = measured.get(row.build) ?? nothingOf(row);
    measured.set(row.build, row.file === null ? before : add(before, row));
  }
  const { kept, announced } = await measureStorage(db, workshop.id);
  return { builds: [...measured.values()], kept, announced, quota: services.settings.WORKSHOP_QUOTA };
});

function nothingOf({ build: id, slug, name }: { build: string; slug: string; name: string }): MeasuredBuild {
  return { id, slug, name, files: 0, bytes: 0, byKind: {}, droppable: { files: 0, bytes: 0 }, deleted: 0 };
}

function add(
  to: MeasuredBuild,
  row: {
    readonly state: string | null;
    readonly kind: string | null;
    readonly originalKept: boolean | null;
    readonly deleted: boolean;
    readonly variants: string[];
    readonly bytes: string;
    readonly originalBytes: string;
  },
): MeasuredBuild {
  const bytes = Number(row.bytes);
  if (row.deleted) return { ...to, bytes: to.bytes + bytes, deleted: to.deleted + bytes };
  const kind = row.kind ?? 'other';
  const could = couldDropOriginal({
    state: row.state ?? '',
    originalKept: row.originalKept ?? false,
    variants: row.variants,
  });
  return {
    ...to,
    files: to.files + (row.state === 'ready' ? 1 : 0),
    bytes: to.bytes + bytes,
    byKind: { ...to.byKind, [kind]: (to.byKind[kind] ?? 0) + bytes },
    droppable: could
      ? { files: to.droppable.files + 1, bytes: to.droppable.bytes + Number(row.originalBytes) }
      : to.droppable,
  };
}
