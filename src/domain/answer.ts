/** What a reader of text gives: the value, or a sentence that says what is wrong. */
export type Answer<Value> =
  { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly error: string };

/** The value that was read. */
export function right<Value>(value: Value): Answer<Value> {
  return { ok: true, value };
}

/** Why nothing was read, as a sentence for the person who wrote the text. */
export function wrong(error: string): { readonly ok: false; readonly error: string } {
  return { ok: false, error };
}
