import { type Chapter } from '../chapters/chapter.ts';
import { type NoteAudience } from '../note-kinds.ts';
import { type NotePlace } from '../notes/note-place.ts';
import { type Rate } from '../time/rate.ts';

/** A note of the episode, as the checks need it. Deleted ones are left out by whoever asks. */
export interface CheckedNote extends NotePlace {
  readonly id: string;
  readonly text: string;
  readonly audience: NoteAudience;
  readonly proposed: boolean;
  /** The topic of the usual caution that it carries. */
  readonly topic: string | null;
  readonly partIds: readonly string[];
  /** Who is asked, by name, while no answer is there; else null. */
  readonly waitsFor: string | null;
}

/** A part that stands in the build's list. */
export interface CheckedPart {
  readonly id: string;
  readonly number: string;
  readonly name: string;
  readonly inPlans: boolean;
}

/** Everything that the checks before publishing look at, read together. */
export interface PublishFacts {
  readonly title: string;
  /** Null while there is none. lengthFrames is null while the length is not known. */
  readonly video: {
    readonly state: 'ready' | 'waiting' | 'failed';
    readonly lengthFrames: number | null;
  } | null;
  readonly rate: Rate;
  /** Null while there is none; how its length and the video’s differ, as a sentence. */
  readonly edit: { readonly lengthsApart: string | null } | null;
  readonly chapters: readonly Chapter[];
  /** How many captions; null without a captions file. */
  readonly captionCount: number | null;
  readonly notes: readonly CheckedNote[];
  readonly parts: readonly CheckedPart[];
  /** The plan revision that viewers hold, such as B; null before the first. */
  readonly revision: string | null;
}
