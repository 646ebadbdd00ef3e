import { type AstroGlobal } from 'astro';
import { type AccountActor, type Context, type WorkshopContext } from '../context.ts';
import { NotFound, SignInNeeded } from '../errors.ts';
import { contextOf } from './request-context.ts';

/** The context of a page outside any workshop. */
export function pageContext(astro: AstroGlobal): Promise<Context> {
  return contextOf(astro.locals.parts, null);
}

/** The context of a page that only someone signed in sees. @throws SignInNeeded */
export async function accountPageContext(
  astro: AstroGlobal,
): Promise<Context & { readonly actor: AccountActor }> {
  const { actor } = astro.locals.parts;
  if (actor.kind === 'anyone') throw new SignInNeeded();
  return { ...(await pageContext(astro)), actor };
}

/**
 * The context of a page of the workshop that its address names.
 * @throws NotFound when there is none
 */
export async function workshopPageContext(astro: AstroGlobal): Promise<WorkshopContext> {
  const context = await contextOf(astro.locals.parts, astro.params['workshop'] ?? '');
  if (context.workshop === null) throw new NotFound('This workshop');
  return { ...context, workshop: context.workshop };
}
