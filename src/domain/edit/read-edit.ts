import { type Answer } from '../answer.ts';
import { type Edit, type ReadEditOptions } from './edit.ts';
import { readEdl } from './read-edl.ts';
import { readOtio } from './read-otio.ts';

/** Reads an edit, whichever of the two forms it has: a timeline begins as JSON does, an edit list never. */
export function readEdit(text: string, options: ReadEditOptions): Answer<Edit> {
  return /^\uFEFF?\s*[{[]/.test(text) ? readOtio(text, options) : readEdl(text, options);
}
