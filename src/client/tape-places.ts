/** Time and height of one place on the tape. */
export interface TapePlace {
  readonly at: number;
  readonly y: number;
}

/** Where a time stands on a tape that runs evenly from place to place, both rising. */
export function heightAt(seconds: number, places: readonly TapePlace[]): number {
  const next = places.findIndex(({ at }) => at > seconds);
  const to = places.at(next);
  const from = next > 0 ? places[next - 1] : to;
  if (!from || !to) return 0;
  if (to.at <= from.at) return to.y;
  return from.y + ((seconds - from.at) / (to.at - from.at)) * (to.y - from.y);
}

/** The time at a height of the same tape. */
export function timeAt(y: number, places: readonly TapePlace[]): number {
  return heightAt(
    y,
    places.map((place) => ({ at: place.y, y: place.at })),
  );
}
