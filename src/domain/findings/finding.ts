import { type NoteKind } from '../note-kinds.ts';

/** What a finding may be: what a careful person would note, a part that is shown or named, or how a part came and was filmed. */
export type FindingKind = Exclude<NoteKind, 'step' | 'tip'> | 'part' | 'unfilmed' | 'arrival';

/** What a setting sets. */
export type SettingName =
  | 'current'
  | 'voltage'
  | 'speed'
  | 'feed'
  | 'electrode'
  | 'wire'
  | 'grit'
  | 'torque'
  | 'temperature'
  | 'pressure'
  | 'time';

/** What can hurt someone, as far as it can be heard. */
export type HeardTopic =
  | 'zinc'
  | 'fumes'
  | 'rotating'
  | 'grinding'
  | 'pressure'
  | 'lifting'
  | 'fire'
  | 'electric'
  | 'dust'
  | 'eyes'
  | 'hearing'
  | 'pinch'
  | 'chemicals'
  | 'load';

/** A value as spoken. */
export interface SpokenValue {
  /** A number in its unit; the name, for a thread. */
  readonly value: number | string;
  readonly unit: string;
  /** The same number exactly, as a fraction or whole number; null for a name. */
  readonly exact: string | null;
  /** In the SI unit of its kind, exactly; null for a name and for what has no one SI value, such as a gauge. */
  readonly si: { readonly value: string; readonly unit: string } | null;
}

/** Words of the captions: from a character of one caption up to, not including, a character of the same or a later one. */
export interface WordSpan {
  /** Captions counted from 1 in the order they were given. */
  readonly from: { readonly cue: number; readonly character: number };
  readonly to: { readonly cue: number; readonly character: number };
  /** Seconds from the start of the video. */
  readonly seconds: readonly [from: number, to: number];
  readonly words: string;
}

/** Something that was read from captions. */
export interface Finding {
  readonly kind: FindingKind;
  readonly span: WordSpan;
  /** The part that is meant, or that a value belongs to; null where none is. */
  readonly part: string | null;
  readonly values?: readonly SpokenValue[];
  readonly what?: SettingName;
  /** A setting that is a name: E7018, a grit. */
  readonly text?: string;
  readonly topic?: HeardTopic;
  /** For a correction: what was said and what the parts list says. */
  readonly sentence?: string;
  /** The rule that found it. */
  readonly rule: string;
  /** How sure it is, from 0 to 1. */
  readonly sure: number;
}

/** A part as the reader knows it. */
export interface ListedPart {
  readonly number: string;
  readonly name: string;
  readonly aliases: readonly string[];
  /** Sizes that the parts list gives, in millimetres, for corrections. */
  readonly sizesMm?: readonly number[];
}

/** How the maker speaks. */
export interface Dialect {
  /** What a bare number is in; found from the captions where it is not given. */
  readonly units?: 'mm' | 'in';
  /** What "mil" is here: a millimetre unless given. */
  readonly mil?: 'mm' | 'thou';
  /** What "ton" is here: 1000 kg unless given. A label stays `t`; only the SI value follows. */
  readonly ton?: 'tonne' | 'short' | 'long';
}
