import { type Edit } from './edit.ts';

/** Endings of the files that cameras and recorders write; a list may leave them out. */
const MEDIA_ENDING = /\.(?:mp4|mov|mts|m2ts|mkv|webm|avi|mxf|wav|mp3|m4a|jpe?g|png|webp|heic)$/;

/** A clip's name as names are compared: without folder, media ending, capitals and outer spaces. */
export function clipNameKey(name: string): string {
  const file = name.normalize('NFC').replace(/^.*[/\\]/u, '');
  return file.trim().toLowerCase().replace(MEDIA_ENDING, '');
}

/**
 * What is kept under a clip's name, where lists write names in more than one way.
 * @returns undefined where there is nothing
 */
export function findByClipName<Value>(
  values: ReadonlyMap<string, Value>,
  names: readonly string[],
): Value | undefined {
  if (values.size === 0) return undefined;
  for (const name of names) {
    const exact = values.get(name);
    if (exact !== undefined) return exact;
  }
  const keys = new Map([...values].map(([name, value]) => [clipNameKey(name), value]));
  return names.map((name) => keys.get(clipNameKey(name))).find((value) => value !== undefined);
}

/** The names of all clips that an edit shows or sounds, each once, pictures first, in the order of the episode. */
export function clipNames(edit: Pick<Edit, 'picture' | 'sound' | 'dissolved'>): string[] {
  return [...new Set([...edit.picture, ...edit.dissolved, ...edit.sound].map(({ clip }) => clip))];
}
