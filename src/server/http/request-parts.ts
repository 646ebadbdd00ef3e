import { type Actor } from '../context.ts';
import { type FieldErrors } from '../errors.ts';
import { type Services } from '../services.ts';

/** What the middleware knows of a request before anything is decided about it. */
export interface RequestParts {
  readonly services: Services;
  readonly actor: Actor;
  readonly requestId: string;
  readonly clientAddress: string;
  readonly headers: Headers;
  readonly setCookies: string[];
}

/** A form that came back: what was entered, and what to say about it. Secrets are never given back. */
export interface FormState {
  readonly values: Readonly<Record<string, string>>;
  readonly errors: FieldErrors;
  readonly message: string | null;
  /** What a form that shows its result in place gave. */
  readonly result?: unknown;
}

export const EMPTY_FORM: FormState = { values: {}, errors: {}, message: null };
