import { existsSync } from 'node:fs';
import { join, resolve } from 'node:path';

/** Where outside data is looked for: in the checkout, or in a folder that several checkouts share. */
const PLACES = ['reference', '../shared/reference'];

/**
 * A folder of outside data, which is no part of the project. Null where it is not there: its tests skip then.
 * @param name of the folder inside, such as webvtt
 */
export function referenceFolder(name: string): string | null {
  return PLACES.map((place) => resolve(join(place, name))).find((folder) => existsSync(folder)) ?? null;
}
