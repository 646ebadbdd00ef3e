/** Whether a text is written as our ids are (RFC 9562, lower case): anything else in an address leads nowhere. */
export function isId(text: string): boolean {
  return /^[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}$/.test(text);
}
