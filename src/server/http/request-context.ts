import { type Context } from '../context.ts';
import { NotFound } from '../errors.ts';
import { findTenant } from '../tenant.ts';
import { type RequestParts } from './request-parts.ts';

/**
 * The context of one request.
 * @param workshopSlug the workshop that the address names; null outside one
 * @throws NotFound when there is no such workshop
 */
export async function contextOf(parts: RequestParts, workshopSlug: string | null): Promise<Context> {
  const { services, actor } = parts;
  const tenant = workshopSlug === null ? null : await findTenant(services.db, workshopSlug, actor);
  if (workshopSlug !== null && tenant === null) throw new NotFound('This workshop');
  return {
    db: services.db,
    actor,
    workshop: tenant?.workshop ?? null,
    role: tenant?.role ?? (actor.kind === 'account' ? 'viewer' : 'anyone'),
    now: new Date(),
    requestId: parts.requestId,
    services,
    headers: parts.headers,
    setCookies: parts.setCookies,
  };
}
