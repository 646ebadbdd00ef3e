import { sortNotes, type NotePlace } from '../notes/note-place.ts';
import { type CautionTopic, isCautionTopic } from './topics.ts';

/** A note that may carry the usual caution of a topic. */
export interface CautionNote extends NotePlace {
  readonly id: string;
  readonly topic: string | null;
}

/** The first note of an episode that carries a topic's caution. */
export interface GatheredCaution {
  readonly topic: CautionTopic;
  readonly noteId: string;
  readonly frame: number;
}

/** The cautions of an episode, each topic once, where it first comes, in the order of the episode. */
export function gatherCautions(notes: readonly CautionNote[]): GatheredCaution[] {
  const first = new Map<CautionTopic, GatheredCaution>();
  for (const { id, topic, frame } of sortNotes(notes))
    if (isCautionTopic(topic) && !first.has(topic)) first.set(topic, { topic, noteId: id, frame });
  return [...first.values()];
}
