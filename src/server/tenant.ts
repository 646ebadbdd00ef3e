import { and, eq } from 'drizzle-orm';
import { type Database } from '../db/client.ts';
import { memberships, workshops, workshopSlugs } from '../db/schema/workshops.ts';
import { type Standing } from '../domain/roles.ts';
import { type Actor, type Workshop } from './context.ts';

export interface Tenant {
  readonly workshop: Workshop;
  readonly role: Standing;
}

/** What an address name can look like; anything else is not looked up. */
const LIKE_A_SLUG = /^[a-z0-9-]{1,100}$/;

/**
 * The workshop that an address names, by its current name or an old one, and what the asker is in it.
 * @returns null when there is none
 */
export async function findTenant(db: Database, slug: string, actor: Actor): Promise<Tenant | null> {
  if (!LIKE_A_SLUG.test(slug)) return null;
  const asked = workshopSlugs;
  const [row] = await db
    .select({ workshop: workshops, slug: asked.slug, current: asked.current })
    .from(asked)
    .innerJoin(workshops, eq(workshops.id, asked.workshopId))
    .where(eq(asked.slug, slug));
  if (!row) return null;
  const current = row.current ? row.slug : await currentSlug(db, row.workshop.id);
  return {
    workshop: { ...row.workshop, slug: current },
    role: actor.kind === 'account' ? await roleOf(db, row.workshop.id, actor.id) : 'anyone',
  };
}

async function currentSlug(db: Database, workshopId: string): Promise<string> {
  const [row] = await db
    .select({ slug: workshopSlugs.slug })
    .from(workshopSlugs)
    .where(and(eq(workshopSlugs.workshopId, workshopId), eq(workshopSlugs.current, true)));
  if (!row) throw new Error(`Workshop ${workshopId} has no current address name.`);
  return row.slug;
}

async function roleOf(db: Database, workshopId: string, accountId: string): Promise<Standing> {
  const [row] = await db
    .select({ role: memberships.role })
    .from(memberships)
    .where(and(eq(memberships.workshopId, workshopId), eq(memberships.accountId, accountId)));
  return row?.role ?? 'viewer';
}
