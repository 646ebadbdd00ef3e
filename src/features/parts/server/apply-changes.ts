import { and, eq, inArray, sql } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { parts, partVersions } from '../../../db/schema/parts.ts';
import { partNumberKey } from '../../../domain/part-numbers.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, Invalid, NotFound } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { MOST_PARTS, type Part, type PartChange } from '../part.ts';
import { checkChanges, type StoredPart } from '../part-changes.ts';
import { findReferences } from './find-references.ts';
import { PART_COLUMNS } from './load-parts.ts';

/** Rows in one statement; PostgreSQL takes 65,535 values. */
const AT_ONCE = 1000;

/**
 * Takes changes to a build's parts, all of them or none. Several may swap their numbers.
 * @returns the changed rows as they are now, without the deleted ones
 * @throws NotFound for a part of another build; Conflict with `{ parts }`: what is stored of every row that changed since it was read; Invalid with
 *   fields such as `changes.3.number`
 */
export async function applyChanges(
  context: WorkshopContext,
  buildId: string,
  changes: readonly PartChange[],
): Promise<Part[]> {
  const { db, workshop, now, actor } = context;
  // One writer a build at a time: doubled numbers are found before they are written.
  await db.select({ id: builds.id }).from(builds).where(eq(builds.id, buildId)).for('no key update');
  const all: StoredPart[] = await db
    .select({ ...PART_COLUMNS, deleted: sql<boolean>`${parts.deletedAt} is not null` })
    .from(parts)
    .where(and(eq(parts.workshopId, workshop.id), eq(parts.buildId, buildId)));
  const stored = new Map(all.map((part) => [part.id, part]));
  const deleting = changes.flatMap((change) => (change.do === 'delete' ? [change.id] : []));
  const { missing, conflicts, errors, count } = checkChanges(
    stored,
    changes,
    await findReferences(db, deleting),
  );
  if (missing) throw new NotFound('This part');
  if (conflicts.length > 0) throw new Conflict({ parts: conflicts });
  if (count > MOST_PARTS) {
    throw new Invalid({ '': `A build has at most ${String(MOST_PARTS)} parts. Nothing was saved.` });
  }
  if (Object.keys(errors).length > 0) throw new Invalid(errors);

  const touched = changes.flatMap(({ id }) => stored.get(id) ?? []);
  for (const some of inGroups(touched)) {
    await db.insert(partVersions).values(
      some.map(({ id, version, ...fields }) => ({
        partId: id,
        workshopId: workshop.id,
        version,
        fields,
        changedBy: actor.kind === 'account' ? actor.id : null,
        changedAt: now,
      })),
    );
    // Out of the way first: rows that swap their numbers would meet in the unique index. No number is so long.
    await db
      .update(parts)
      .set({ numberKey: sql`'moving ' || ${parts.id}` })
      .where(
        inArray(
          parts.id,
          some.map(({ id }) => id),
        ),
      );
  }
  await onUniqueViolation(
    { parts_pkey: { '': 'That part has an id that is taken. Open the page again and add it anew.' } },
    async () => {
      const added = changes.flatMap((change) =>
        change.do === 'add' ? [{ id: change.id, ...columnsOf(change.fields) }] : [],
      );
      for (const some of inGroups(added)) {
        await db.insert(parts).values(some.map((row) => ({ ...row, workshopId: workshop.id, buildId })));
      }
    },
  );
  for (const change of changes) {
    if (change.do === 'add') continue;
    const before = stored.get(change.id);
    await db
      .update(parts)
      .set({
        ...(change.do === 'change'
          ? columnsOf(change.fields)
          : { numberKey: partNumberKey(before?.number ?? '') }),
        deletedAt: change.do === 'delete' ? now : null,
        version: sql`${parts.version} + 1`,
        updatedAt: now,
      })
      .where(eq(parts.id, change.id));
  }
  await announcePageChanges(db, [`build:${buildId}`]);
  return changes.flatMap((change) => {
    if (change.do === 'delete') return [];
    const before = stored.get(change.id);
    const version = (before?.version ?? 0) + 1;
    if (change.do === 'restore') return before ? [{ ...fieldsOf(before), version }] : [];
    return [{ id: change.id, ...change.fields, version }];
  });
}

function fieldsOf({ deleted: _deleted, ...part }: StoredPart): Part {
  return part;
}

function columnsOf(fields: Extract<PartChange, { do: 'add' }>['fields']) {
  return { ...fields, numberKey: partNumberKey(fields.number) };
}

function inGroups<Row>(rows: readonly Row[]): Row[][] {
  return Array.from({ length: Math.ceil(rows.length / AT_ONCE) }, (_, group) =>
    rows.slice(group * AT_ONCE, (group + 1) * AT_ONCE),
  );
}
