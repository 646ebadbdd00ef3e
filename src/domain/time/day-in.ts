/** The day it is somewhere, as 2026-11-12. @param timeZone an IANA name */
export function dayIn(timeZone: string, instant: Date): string {
  // Swedish writes dates as ISO 8601 does.
  return instant.toLocaleDateString('sv-SE', { timeZone });
}
