/** An answer with the tag that tells whether there is a newer one. */
export interface Tagged {
  readonly tag: string | null;
  readonly answer: unknown;
}

/**
 * Asks again for something that may not have changed since: then nothing is sent.
 * @param last what was answered the last time
 * @throws Error when nothing, or no answer, came
 */
export async function callTagged(path: string, last: Tagged | undefined): Promise<Tagged> {
  const known = last?.tag ?? null;
  const response = await fetch(path, {
    headers: { accept: 'application/json', ...(known !== null && { 'if-none-match': known }) },
  });
  if (response.status === 304 && last !== undefined) return last;
  if (!response.ok) throw new Error(`The server answered ${String(response.status)}.`);
  return { tag: response.headers.get('etag'), answer: await response.json() };
}
