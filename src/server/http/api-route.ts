import { type APIContext, type APIRoute } from 'astro';
import { z } from 'zod';
import { type FieldErrors, Invalid } from '../errors.ts';
import { addressKey, type Limit } from '../limits/rate-limiter.ts';
import { type Ruled } from '../verb.ts';
import { type ErrorAnswer, jsonError, toErrorAnswer } from './error-answer.ts';
import { requireOwnOrigin } from './origin.ts';
import { readBody, type RequestBody, requireWholeText } from './request-body.ts';
import { contextOf } from './request-context.ts';
import { type RequestParts } from './request-parts.ts';

type Shape = z.ZodType<Readonly<Record<string, unknown>>>;

/** What a plain form does, without any script: where it stands, and where it leads when done. */
export interface FormRule<Params, Input, Result> {
  /** The page that holds the form; it is shown again with what was entered when something is wrong. */
  readonly page: (params: Params, values: Readonly<Record<string, string>>) => string;
  /** Where to go when done (303), or null to show the page with the result in place. */
  readonly done: (result: Result, input: Input) => string | null;
  /** Fields that are never given back. */
  readonly secrets?: readonly string[];
}

export interface RouteRule<P extends Shape, B extends Shape, Result, A extends z.ZodType> {
  readonly verb: Ruled<z.output<P> & z.output<B>, Result>;
  readonly params: P;
  /** The body of a write, or the query of a read. */
  readonly body: B;
  readonly answer: A;
  /** Answers with something else than JSON, such as a file. */
  readonly reply?: (result: Result) => Response;
  readonly limit?: readonly Limit[];
  readonly form?: FormRule<z.output<P>, z.output<P> & z.output<B>, Result>;
  /** Only for a route that reads no cookie and whose address carries its authority. */
  readonly origin?: 'any';
}

export interface RuledRoute extends APIRoute {
  readonly route: RouteRule<Shape, Shape, unknown, z.ZodType>;
}

export const NONE = z.object({});

/**
 * Makes an Astro endpoint of a verb or a read: origin, rule and limits checked, input parsed once, errors mapped
 * once. The workshop is the one that the path names as `[workshop]`.
 * JSON in gives JSON out; a plain form in gives 303, or its page again with what was entered.
 */
export function apiRoute<P extends Shape, B extends Shape, Result, A extends z.ZodType>(
  rule: RouteRule<P, B, Result, A>,
): RuledRoute {
  async function handle(context: APIContext): Promise<Response> {
    const { parts } = context.locals;
    let body: RequestBody = { kind: 'none', values: {} };
    try {
      const writes = rule.verb.rule.kind === 'write';
      if (writes && rule.origin !== 'any')
        requireOwnOrigin(context.request.headers, parts.services.settings.PUBLIC_URL);
      body = writes ? await readBody(context.request) : queryOf(context.url);
      const asked = await contextOf(parts, context.params['workshop'] ?? null);
      // Before the input is looked at: who may not learns nothing of what would have been taken.
      rule.verb.check(asked);
      const input = {
        ...parse(rule.params, context.params),
        ...parse(rule.body, body.values),
      } as z.output<P> & z.output<B>;
      await countTries(rule.limit ?? [], parts, input);
      const result = await rule.verb(asked, input);
      if (body.kind === 'form' && rule.form)
        return await answerForm(context, rule.form, result, input, keptValues(body, rule.form.secrets ?? []));
      if (rule.reply) return rule.reply(result);
      return Response.json(rule.answer.parse(result) ?? null, { headers: { 'cache-control': 'no-store' } });
    } catch (error) {
      const answer = toErrorAnswer(error, parts.requestId, parts.services.log);
      return body.kind === 'form' && rule.form
        ? answerFormError(context, rule.form, answer, body)
        : jsonError(answer);
    }
  }
  return Object.assign(handle, { route: rule as unknown as RuledRoute['route'] });
}

function queryOf(url: URL): RequestBody {
  return { kind: 'none', values: Object.fromEntries(url.searchParams) };
}

function parse<S extends Shape>(schema: S, values: Readonly<Record<string, unknown>>): z.output<S> {
  requireWholeText(values);
  // For a schema that says nothing of its own: no reader is told of expected strings.
  const parsed = schema.safeParse(values, { error: () => 'This is missing, or not what belongs here.' });
  if (parsed.success) return parsed.data;
  const fields: Record<string, string> = {};
  for (const issue of parsed.error.issues) fields[issue.path.join('.')] ??= issue.message;
  throw new Invalid(fields satisfies FieldErrors);
}

async function countTries(limits: readonly Limit[], parts: RequestParts, input: object): Promise<void> {
  for (const limit of limits) {
    const key = keyOf(limit, parts, input);
    if (key !== null) await parts.services.limiter.count(limit, key);
  }
}

function keyOf(limit: Limit, parts: RequestParts, input: object): string | null {
  if (limit.by === 'address') return addressKey(parts.clientAddress);
  if (limit.by === 'account') return parts.actor.kind === 'account' ? parts.actor.id : null;
  const email = (input as Record<string, unknown>)['email'];
  return typeof email === 'string' ? email.toLowerCase() : null;
}

async function answerForm<P, I, R>(
  context: APIContext,
  form: FormRule<P, I, R>,
  result: R,
  input: I,
  values: Readonly<Record<string, string>>,
): Promise<Response> {
  const next = form.done(result, input);
  if (next !== null) return context.redirect(next, 303);
  return showFormPage(context, form.page(context.params as P, values), 200, {
    values: {},
    errors: {},
    message: null,
    result,
  });
}

async function answerFormError<P, I, R>(
  context: APIContext,
  form: FormRule<P, I, R>,
  answer: ErrorAnswer,
  body: RequestBody,
): Promise<Response> {
  const values = keptValues(body, form.secrets ?? []);
  const { code, message, fields } = answer;
  if (code === 'sign_in_needed' || code === 'second_factor_needed') {
    return context.redirect(context.locals.detourFor(code, form.page(context.params as P, values)), 303);
  }
  const shown = await showFormPage(context, form.page(context.params as P, values), answer.status, {
    values,
    errors: fields,
    message,
  });
  if (answer.retryAfterSeconds !== undefined)
    shown.headers.set('retry-after', String(answer.retryAfterSeconds));
  return shown;
}

function keptValues(body: RequestBody, secrets: readonly string[]): Record<string, string> {
  const kept = Object.entries(body.values).filter(
    (entry): entry is [string, string] => typeof entry[1] === 'string' && !secrets.includes(entry[0]),
  );
  return Object.fromEntries(kept);
}

async function showFormPage(
  context: APIContext,
  page: string,
  status: number,
  form: App.Locals['form'],
): Promise<Response> {
  context.locals.form = form;
  // The body has been read; the page is asked for anew, as a GET.
  const shown = await context.rewrite(
    new Request(new URL(page, context.url), { headers: context.request.headers }),
  );
  const headers = new Headers(shown.headers);
  headers.set('cache-control', 'no-store');
  return new Response(shown.body, { status, headers });
}
