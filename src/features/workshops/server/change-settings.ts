import { and, eq, sql } from 'drizzle-orm';
import { workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Conflict, Invalid } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { findTenant } from '../../../server/tenant.ts';
import { verb } from '../../../server/verb.ts';
import { type ChangeSettings } from '../workshop.ts';

/**
 * Changes a workshop's settings. An old address name keeps leading here.
 * @throws Conflict with the stored settings when they changed since they were read
 */
export const changeSettings = verb(
  { may: 'workshop.change-settings' },
  async ({ db, actor, workshop, now }, input: ChangeSettings) => {
    const { slug, version, ...settings } = input;
    const [saved] = await db
      .update(workshops)
      .set({ ...settings, version: sql`${workshops.version} + 1`, updatedAt: now })
      .where(and(eq(workshops.id, workshop.id), eq(workshops.version, version)))
      .returning({ id: workshops.id });
    if (!saved) {
      const stored = await findTenant(db, workshop.slug, actor);
      throw new Conflict(
        stored?.workshop,
        'Someone else changed these settings in the meantime. What you entered is kept below; look it over and save again.',
      );
    }
    if (slug !== workshop.slug) await moveTo(slug);
    await announcePageChanges(db, ['workshops', `workshop:${workshop.id}`]);
    return { slug };

    async function moveTo(next: string): Promise<void> {
      await db
        .update(workshopSlugs)
        .set({ current: false })
        .where(and(eq(workshopSlugs.workshopId, workshop.id), eq(workshopSlugs.current, true)));
      const [own] = await db
        .update(workshopSlugs)
        .set({ current: true })
        .where(and(eq(workshopSlugs.workshopId, workshop.id), eq(workshopSlugs.slug, next)))
        .returning({ slug: workshopSlugs.slug });
      if (own) return;
      await onUniqueViolation(
        { workshop_slugs_pkey: new Invalid({ slug: 'That address name is taken. Choose another.' }).fields },
        () => db.insert(workshopSlugs).values({ slug: next, workshopId: workshop.id, current: true }),
      );
    }
  },
);
