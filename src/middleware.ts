import { type APIContext } from 'astro';
import { defineMiddleware } from 'astro:middleware';
import { isPublicPage, paths } from './paths.ts';
import { readSession } from './server/auth/session.ts';
import { amendPolicy, storageSources } from './server/http/content-policy.ts';
import { toErrorAnswer } from './server/http/error-answer.ts';
import { EMPTY_FORM } from './server/http/request-parts.ts';

/** Who asks, and what becomes of a page that cannot be shown. Decides nothing about who may what. */
export const onRequest = defineMiddleware(async (context, next) => {
  const { locals } = context;
  // A rewrite comes through here again with everything in place.
  if ((locals as Partial<App.Locals>).parts !== undefined) return next();

  if (import.meta.env.DEV) await fillLocalsInDev(locals, context);
  const { services, requestId, clientAddress } = locals;
  const { headers } = context.request;
  const session = isPublicPage(context.url.pathname)
    ? { actor: { kind: 'anyone' as const }, setCookies: [] }
    : await readSession(services.auth, services.settings, headers);
  locals.form = EMPTY_FORM;
  locals.detourFor = (code, page) =>
    code === 'second_factor_needed' ? paths.secondFactor(page) : paths.signIn(page);
  locals.parts = {
    services,
    actor: session.actor,
    requestId,
    clientAddress,
    headers,
    setCookies: [...session.setCookies],
  };

  const response = await answer();
  const policy = response.headers.get('content-security-policy');
  if (policy !== null && response.headers.get('content-type')?.startsWith('text/html')) {
    const sources = storageSources(services.settings.S3_PUBLIC_ENDPOINT);
    response.headers.set('content-security-policy', amendPolicy(policy, sources));
  }
  for (const cookie of locals.parts.setCookies) response.headers.append('set-cookie', cookie);
  if (!isPublicPage(context.url.pathname) && !response.headers.has('cache-control')) {
    response.headers.set('cache-control', 'private, no-store');
  }
  return response;

  async function answer(): Promise<Response> {
    try {
      return await next();
    } catch (error) {
      const { status, code, message } = toErrorAnswer(error, requestId, services.log);
      if (code === 'sign_in_needed' || code === 'second_factor_needed') {
        return context.redirect(locals.detourFor(code, context.url.pathname + context.url.search), 303);
      }
      locals.form = { ...EMPTY_FORM, message };
      const page = await context.rewrite(status === 404 ? '/404' : '/error');
      return new Response(page.body, { status, headers: page.headers });
    }
  }
});

/** Without a front server, in development, the page server looks after what it would have been given. */
async function fillLocalsInDev(locals: App.Locals, context: APIContext): Promise<void> {
  const { developmentServices } = await import('./development-services.ts');
  locals.services = await developmentServices();
  locals.requestId = crypto.randomUUID();
  locals.clientAddress = context.clientAddress;
}
