import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { parts } from '../../../db/schema/parts.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { type Part } from '../part.ts';

/** The columns of a part as others know it. */
export const PART_COLUMNS = {
  id: parts.id,
  number: parts.number,
  name: parts.name,
  kind: parts.kind,
  quantity: parts.quantity,
  material: parts.material,
  size: parts.size,
  aliases: parts.aliases,
  inPlans: parts.inPlans,
  remark: parts.remark,
  version: parts.version,
} as const;

/** The parts of a build by number: 9 before 10, A2 before A10. */
export function loadParts({ db, workshop }: WorkshopContext, buildId: string): Promise<Part[]> {
  return db
    .select(PART_COLUMNS)
    .from(parts)
    .where(and(eq(parts.workshopId, workshop.id), eq(parts.buildId, buildId), isNull(parts.deletedAt)))
    .orderBy(asc(sql`${parts.number} collate "part_numbers"`));
}

/** One part of a build. @throws NotFound */
export async function loadPart(
  { db, workshop }: WorkshopContext,
  buildId: string,
  id: string,
): Promise<Part> {
  const [part] = await db
    .select(PART_COLUMNS)
    .from(parts)
    .where(
      and(
        eq(parts.workshopId, workshop.id),
        eq(parts.buildId, buildId),
        eq(parts.id, id),
        isNull(parts.deletedAt),
      ),
    );
  if (!part) throw new NotFound('This part');
  return part;
}
