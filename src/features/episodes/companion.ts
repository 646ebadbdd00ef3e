import { type CautionTopic } from '../../domain/cautions/topics.ts';
import { type Appearance } from '../../domain/appearances/appearance.ts';
import { type NoteKind, type SizeStanding } from '../../domain/note-kinds.ts';
import { type PartKind } from '../../domain/part-kinds.ts';
import { type Rate } from '../../domain/time/rate.ts';
import { type VideoAddress } from '../../domain/video-addresses/read-video-address.ts';
import { type ShownResult } from '../notes/note-result.ts';

/** A part that an episode shows. */
export interface CompanionPart {
  readonly id: string;
  readonly number: string;
  readonly name: string;
  readonly kind: PartKind;
  readonly quantity: number;
  readonly material: string;
  readonly size: string;
  readonly inPlans: boolean;
}

/** A note as viewers see it, at its place in the shown edition. */
export interface CompanionNote {
  readonly id: string;
  readonly kind: NoteKind;
  readonly text: string;
  readonly standing: SizeStanding | null;
  readonly topic: CautionTopic | null;
  readonly partIds: readonly string[];
  /** From its first frame up to where it stops holding, in frames of the video. */
  readonly from: number;
  readonly to: number;
  /** Seconds from the start of the video. */
  readonly at: number;
  /** What of a worksheet it carries. */
  readonly result: ShownResult | null;
}

export interface CompanionChapter {
  readonly id: string;
  readonly title: string;
  readonly from: number;
  readonly at: number;
}

/** The usual caution of a topic, at the note where it first comes. */
export interface CompanionCaution {
  readonly topic: CautionTopic;
  readonly noteId: string;
  readonly at: number;
}

/** A video kept here, as far as its page needs it. */
export interface KeptVideo {
  readonly id: string;
  readonly width: number | null;
  readonly height: number | null;
  readonly hasPoster: boolean;
}

export interface CompanionVideo {
  /** Exactly one of the two is there. */
  readonly kept: KeptVideo | null;
  readonly elsewhere: VideoAddress | null;
  /** Null while nobody has said how long it is. */
  readonly seconds: number | null;
  readonly rate: Rate;
}

/** One line of the series: an episode on show, or a number that is planned. */
export interface SeriesItem {
  readonly number: number;
  readonly title: string;
}

/** A cut at which work is missing that was done with the camera off. */
export interface OffCameraCut {
  /** Seconds from the start of the video. */
  readonly at: number;
  readonly minutes: number;
  /** What was written of it; for the team. */
  readonly texts: readonly string[];
}

/** Everything that the page of a published episode shows. */
export interface Companion {
  readonly build: { readonly id: string; readonly slug: string; readonly name: string };
  readonly episode: {
    readonly id: string;
    readonly number: number;
    readonly title: string;
    readonly about: string;
    /** As 2026-11-12. */
    readonly publishedOn: string | null;
  };
  readonly video: CompanionVideo;
  readonly captions: { readonly id: string; readonly language: string } | null;
  readonly notes: readonly CompanionNote[];
  readonly chapters: readonly CompanionChapter[];
  readonly appearances: readonly Appearance[];
  /** Those that come into view or are named, in the order in which they first do. */
  readonly parts: readonly CompanionPart[];
  readonly cautions: readonly CompanionCaution[];
  readonly offCamera: readonly OffCameraCut[];
  readonly series: readonly SeriesItem[];
  /** How many episodes the series has or plans. */
  readonly of: number;
}

/** Where a part is in view in one published episode. */
export interface PartPlaces {
  readonly episode: { readonly id: string; readonly number: number; readonly title: string };
  readonly places: readonly {
    /** Seconds from the start of the video. */
    readonly at: number;
    /** The note that brings it into view; null where that was set by hand. */
    readonly note: Pick<CompanionNote, 'id' | 'kind' | 'text' | 'standing' | 'topic'> | null;
  }[];
}

/** An episode's number as its address has it; 0, which no episode has, for anything else. */
export function numberInAddress(text: string | undefined): number {
  return /^[1-9]\d{0,3}$/.test(text ?? '') ? Number(text) : 0;
}
