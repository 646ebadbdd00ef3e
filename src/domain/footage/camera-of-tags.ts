import { CAMERA_NAME_LENGTH } from './named-clip.ts';

/** Where cameras and phones write their maker and model, in small letters. */
const MAKERS = ['com.apple.quicktime.make', 'com.android.manufacturer', 'make'];
const MODELS = ['com.apple.quicktime.model', 'com.android.model', 'model'];

/**
 * The camera that a film's tags name: its maker and model; null when they name none.
 * @param tags by lower-case name
 */
export function cameraOfTags(tags: Readonly<Record<string, string>>): string | null {
  const [maker, model] = [firstOf(tags, MAKERS), firstOf(tags, MODELS)];
  // Many write their maker into the model too.
  const whole = model.toLowerCase().startsWith(maker.toLowerCase()) ? model : `${maker} ${model}`;
  return whole.slice(0, CAMERA_NAME_LENGTH).trim() || null;
}

function firstOf(tags: Readonly<Record<string, string>>, names: readonly string[]): string {
  const written = names.map((name) => tags[name]).find((value) => value !== undefined) ?? '';
  return written
    .normalize('NFC')
    .replace(/[\p{Cc}\p{Cf}\u2028\u2029]/gu, '')
    .replace(/\s+/g, ' ')
    .trim();
}
