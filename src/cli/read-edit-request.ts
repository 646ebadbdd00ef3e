import { z } from 'zod';
import { type Answer, right, wrong } from '../domain/answer.ts';
import { type Edit } from '../domain/edit/edit.ts';
import { readEdit } from '../domain/edit/read-edit.ts';
import { parseRate, type Rate } from '../domain/time/rate.ts';

const rate = z.union([z.string(), z.number()], 'Give the rate, such as 25 or 30000/1001.').transform(String);
const CLIP_FPS = 'Give the rate of a clip as NAME=RATE, such as C0043=50.';

/** The fields that say which edit is meant, and how it counts. */
export const editFields = {
  edl: z.string('An edit list is text.').optional(),
  otio: z.union([z.string(), z.record(z.string(), z.unknown())], 'A timeline is text.').optional(),
  fps: rate.optional(),
  'clip-fps': z.union([z.string(), z.array(z.string()), z.record(z.string(), rate)], CLIP_FPS).optional(),
};
type Asked = z.output<z.ZodObject<typeof editFields>>;

/** The rates of clips that a request gives, by name. */
export function readClipRates(asked: Asked['clip-fps']): Answer<ReadonlyMap<string, Rate>> {
  const rates = new Map<string, Rate>();
  const written: (readonly [string, string])[] = [];
  if (typeof asked === 'object' && !Array.isArray(asked)) written.push(...Object.entries(asked));
  else
    for (const one of asked === undefined ? [] : [asked].flat()) {
      // A clip's name may hold the sign itself; a rate never does.
      const [, name, clipRate] = /^(.+)=([^=]+)$/s.exec(one) ?? [];
      if (name === undefined || clipRate === undefined) return wrong(CLIP_FPS);
      written.push([name, clipRate]);
    }
  for (const [name, text] of written) {
    const read = parseRate(text);
    if (!read.ok) return read;
    rates.set(name, read.value);
  }
  return right(rates);
}

/** The edit of a request. */
export function readEditOf({ edl, otio, fps, 'clip-fps': clipFps }: Asked): Answer<Edit> {
  if ((edl === undefined) === (otio === undefined)) return wrong('Give one edit list or one timeline.');
  const read = fps === undefined ? right(null) : parseRate(fps);
  if (!read.ok) return read;
  const clipRates = readClipRates(clipFps);
  if (!clipRates.ok) return clipRates;
  const text = typeof otio === 'object' ? JSON.stringify(otio) : (otio ?? edl ?? '');
  return readEdit(text, { rate: read.value, clipRates: clipRates.value });
}
