/** What the server says of a request it did not do; `message` is a sentence for the person. */
export class ApiError extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    message: string,
    readonly fields: Readonly<Record<string, string>>,
    /** On a conflict: what is stored. */
    readonly stored: unknown,
  ) {
    super(message);
  }
}

const NO_ANSWER = 'The server did not answer. What you entered is still here; it is tried again.';

/**
 * Asks our API, by GET or with a body by POST.
 * @throws ApiError; its status is 0 when nothing answered
 */
export async function callApi(path: string, body?: unknown): Promise<unknown> {
  let response: Response;
  try {
    response = await fetch(
      path,
      body === undefined
        ? { headers: { accept: 'application/json' } }
        : {
            method: 'POST',
            headers: { accept: 'application/json', 'content-type': 'application/json' },
            body: JSON.stringify(body),
          },
    );
  } catch {
    throw new ApiError(0, 'no_answer', NO_ANSWER, {}, undefined);
  }
  const answer: unknown = await response.json().catch(() => null);
  if (response.ok) return answer;
  const { error } = (answer ?? {}) as { error?: Partial<ApiError> };
  throw new ApiError(
    response.status,
    error?.code ?? 'failed',
    error?.message ?? NO_ANSWER,
    error?.fields ?? {},
    error?.stored,
  );
}
