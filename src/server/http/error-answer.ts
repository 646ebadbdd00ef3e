import { type Logger } from 'pino';
import { AppError, Conflict, type FieldErrors, Invalid, TooMany } from '../errors.ts';

/** What the reader is told of an error, whatever form it is told in. */
export interface ErrorAnswer {
  readonly status: number;
  readonly code: string;
  readonly message: string;
  readonly fields: FieldErrors;
  readonly stored?: unknown;
  readonly retryAfterSeconds?: number;
}

/** Maps any error to an answer; one that is not ours is logged with its request id and hidden from the reader. */
export function toErrorAnswer(error: unknown, requestId: string, log: Logger): ErrorAnswer {
  if (error instanceof AppError) {
    return {
      status: error.status,
      code: error.code,
      message: error.message,
      fields: error instanceof Invalid ? error.fields : {},
      ...(error instanceof Conflict && { stored: error.stored }),
      ...(error instanceof TooMany && { retryAfterSeconds: Math.ceil(error.retryAfterSeconds) }),
    };
  }
  log.error({ requestId, err: error }, 'A request failed.');
  return {
    status: 500,
    code: 'failed',
    message: `Something broke on our side, and nothing was saved. Try again; if it happens again, tell us ${requestId}.`,
    fields: {},
  };
}

/** The answer as JSON, for islands and scripts. */
export function jsonError(answer: ErrorAnswer): Response {
  const { status, retryAfterSeconds, ...body } = answer;
  return Response.json(
    { error: body },
    {
      status,
      headers: {
        'cache-control': 'no-store',
        ...(retryAfterSeconds !== undefined && { 'retry-after': String(retryAfterSeconds) }),
      },
    },
  );
}
