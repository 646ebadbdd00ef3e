import { memberships, workshops, workshopSlugs } from '../../../db/schema/workshops.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { newId } from '../../../db/columns.ts';

/** Makes a workshop and its maker the owner. @throws Invalid at `slug` when the address name is taken */
export const makeWorkshop = verb(
  { may: 'workshop.make' },
  async ({ db, actor }, { name, slug, timeZone }: { name: string; slug: string; timeZone: string }) => {
    const id = newId();
    await db.insert(workshops).values({ id, name, timeZone, language: 'en' });
    await onUniqueViolation(
      { workshop_slugs_pkey: { slug: 'That address name is taken. Choose another.' } },
      () => db.insert(workshopSlugs).values({ slug, workshopId: id, current: true }),
    );
    await db.insert(memberships).values({ workshopId: id, accountId: actor.id, role: 'owner' });
    await announcePageChanges(db, ['workshops', `workshop:${id}`]);
    return { id, slug };
  },
);
