/** How long it says that something was copied, in milliseconds. */
const SAID_MS = 4000;

/** Copies a text and says so for a while. @returns whether it may be copied here at all */
export async function copy(text: string, status: Element | null, said: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
  } catch {
    return false;
  }
  if (status) {
    status.textContent = said;
    setTimeout(() => (status.textContent = ''), SAID_MS);
  }
  return true;
}
