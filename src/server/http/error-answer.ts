import { type Logger } from 'pino';
import { type FieldErrors, isAppError } from '../errors.ts';

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
  if (isAppError(error)) {
    const { status, code, message, fields = {}, stored, retryAfterSeconds } = error;
    return {
      status,
      code,
      message,
      fields,
      ...(stored !== undefined && { stored }),
      ...(retryAfterSeconds !== undefined && { retryAfterSeconds: Math.ceil(retryAfterSeconds) }),
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
