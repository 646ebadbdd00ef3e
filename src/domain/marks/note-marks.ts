import { isCautionTopic } from '../cautions/topics.ts';
import { USUAL_CAUTIONS } from '../cautions/usual-cautions.ts';
import { type NoteKind } from '../note-kinds.ts';

/** What a note is drawn in on a timeline: red for what can hurt or is wrong. Our own choice of OpenTimelineIO's colours. */
const COLOURS: Readonly<Record<NoteKind, string>> = {
  step: 'BLUE',
  size: 'GREEN',
  setting: 'GREEN',
  rating: 'GREEN',
  change: 'ORANGE',
  undecided: 'YELLOW',
  correction: 'RED',
  caution: 'RED',
  ask: 'PURPLE',
  tip: 'CYAN',
};

/** A chapter's colour among them. */
export const CHAPTER_COLOUR = 'WHITE';

/** A note as a mark says it: its kind, its parts, its words; a usual caution by its own. */
export function markOfNote(note: {
  readonly kind: NoteKind;
  readonly text: string;
  readonly topic: string | null;
  /** Numbers of the parts it names. */
  readonly parts: readonly string[];
}): { readonly name: string; readonly colour: string } {
  const { kind, text, topic, parts } = note;
  const words = text === '' && isCautionTopic(topic) ? USUAL_CAUTIONS[topic].words : text;
  const about = parts.length === 0 ? kind : `${kind} ${parts.join(', ')}`;
  return { name: `${about}: ${words}`, colour: COLOURS[kind] };
}
