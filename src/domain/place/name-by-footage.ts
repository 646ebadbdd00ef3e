import { type Edit, type Segment } from '../edit/edit.ts';

/**
 * An edit that calls its clips by the ids of the footage, so that two names of one clip are one, and a name that two
 * cameras gave is told apart.
 * @param clipIds by the names that the edit has; null for what is none of the footage
 */
export function nameByFootage(edit: Edit, clipIds: ReadonlyMap<string, string | null>): Edit {
  const rename = (segment: Segment): Segment => ({
    ...segment,
    // No id is empty: what is none of the footage is found by nothing.
    clip: clipIds.get(segment.clip) ?? '',
    alsoCalled: [],
  });
  return {
    ...edit,
    picture: edit.picture.map(rename),
    sound: edit.sound.map(rename),
    dissolved: edit.dissolved.map(rename),
  };
}
