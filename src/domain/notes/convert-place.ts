import { convertEndFrame, convertFrame } from '../time/frames.ts';
import { type Rate } from '../time/rate.ts';
import { type NotePlace } from './note-place.ts';

/** A place in frames of another rate: the start on the frame that shows it, the end after all it held. */
export function convertPlace(place: NotePlace & { readonly rate: Rate }, to: Rate): NotePlace {
  const { frame, endFrame, rate } = place;
  return {
    frame: convertFrame(frame, rate, to),
    endFrame: endFrame === null ? null : convertEndFrame(endFrame, rate, to),
  };
}
