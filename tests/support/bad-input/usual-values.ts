import { newId } from '../../../src/db/columns.ts';

const POSITION = { frame: 25, endFrame: null, rate: { num: 25, den: 1 } };

/** Something usual for a field, by its name: in a request of these one at a time is made bad. */
const USUAL: Readonly<Record<string, unknown>> = {
  anchor: { clock: 'episode', episode: newId(), position: POSITION },
  about: 'A frame press.',
  bytes: 4096,
  changes: [{ do: 'delete', id: newId(), version: 1 }],
  currency: 'GBP',
  day: '2026-03-14',
  email: 'guest@example.com',
  entries: 'none',
  fingerprint: 'a'.repeat(64),
  from: '14:20',
  jpeg: 'AAAA',
  kind: 'step',
  language: 'en',
  length: '1:00',
  lines: '1\tThe frame\thttps://video.example/1\t2026-03-14',
  name: 'Bearing housing',
  number: '7',
  numbers: [1],
  photos: [],
  position: POSITION,
  rate: POSITION.rate,
  role: 'editor',
  segments: 'C0043.MP4,0,1',
  slug: 'another-name',
  text: 'The housing goes on.',
  timeZone: 'Europe/London',
  title: 'The drum and its shaft',
  to: 'up',
  until: '15:05',
  version: 1,
  visibility: 'private',
};

/** What may fit where the name says nothing. */
const ANYTHING: readonly unknown[] = [newId(), 'press-and-mill', '123456', 1, true, [], 'on', '', null];

interface Schema {
  readonly safeParse: (value: unknown) => { readonly success: boolean };
}

/** A usual value that a field takes; undefined when it may be left out and nothing else is known. */
export function usualValue(name: string, schema: Schema): unknown {
  return [USUAL[name], undefined, ...ANYTHING].find((value) => schema.safeParse(value).success);
}
