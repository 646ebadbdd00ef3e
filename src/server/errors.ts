/** What went wrong with what was sent: a sentence a field; the empty name is the whole form. */
export type FieldErrors = Readonly<Record<string, string>>;

const APP_ERROR = Symbol.for('centrepop.app-error');

/** An error that the reader is told about; its message is shown as it stands. */
export abstract class AppError extends Error {
  readonly [APP_ERROR] = true;
  abstract readonly code: string;
  abstract readonly status: number;
}

/** Also what another workshop's things are: an id there must not answer differently from one that never was. */
export class NotFound extends AppError {
  readonly code = 'not_found';
  readonly status = 404;
  constructor(what = 'This page') {
    super(`${what} is not here.`);
  }
}

export class SignInNeeded extends AppError {
  readonly code = 'sign_in_needed';
  readonly status = 401;
  constructor() {
    super('Sign in first.');
  }
}

export class SecondFactorNeeded extends AppError {
  readonly code = 'second_factor_needed';
  readonly status = 403;
  constructor() {
    super('Owners need a second factor. Set it up first; nothing was changed.');
  }
}

export class Forbidden extends AppError {
  readonly code = 'forbidden';
  readonly status = 403;
  constructor(reason = 'Your role in this workshop does not allow that. Nothing was changed.') {
    super(reason);
  }
}

export class Invalid extends AppError {
  readonly code = 'invalid';
  readonly status = 422;
  constructor(readonly fields: FieldErrors) {
    super(fields[''] ?? 'Some of it needs another look. Nothing was saved; what you entered is kept.');
  }
}

/** Two people saved the same row: carries the stored one, so that both texts can be shown. */
export class Conflict extends AppError {
  readonly code = 'conflict';
  readonly status = 409;
  constructor(
    readonly stored: unknown,
    message = 'Someone else saved this in the meantime. Both versions are kept; choose one.',
  ) {
    super(message);
  }
}

export class TooMany extends AppError {
  readonly code = 'too_many';
  readonly status = 429;
  constructor(readonly retryAfterSeconds: number) {
    super(`Too many tries. Wait ${sayWait(retryAfterSeconds)} and try again; what you entered is kept.`);
  }
}

/** The request itself is off: not a form, not JSON, from another site. */
export class BadRequest extends AppError {
  readonly code = 'bad_request';
  readonly status = 400;
}

function sayWait(seconds: number): string {
  if (seconds < 90) return `${String(Math.max(1, Math.ceil(seconds)))} seconds`;
  return `${String(Math.ceil(seconds / 60))} minutes`;
}

/**
 * Whether an error is one of these. The pages and the process around them are bundled apart, so that the same
 * class exists twice: what they throw at each other is known by its mark, not by its class.
 */
export function isAppError(error: unknown): error is AppError & {
  readonly fields?: FieldErrors;
  readonly stored?: unknown;
  readonly retryAfterSeconds?: number;
} {
  return error instanceof Error && APP_ERROR in error;
}
