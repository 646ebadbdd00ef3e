import { type NoteKind } from '../note-kind.ts';

/** A part that comes on the bench at a second. */
export type RuleBalloon = {
  readonly id: string;
  readonly at: number;
  /** The part's number. */
  readonly label: string;
  readonly name?: string | undefined;
  readonly filled?: boolean | undefined;
  readonly dashed?: boolean | undefined;
  readonly href?: string | undefined;
};

/** A note's place. */
export type RulePop = {
  readonly id: string;
  readonly at: number;
  readonly kind: NoteKind;
  /** The note's words, or the start of them. */
  readonly label: string;
  readonly href: string;
};

export type RuleChapter = { readonly at: number; readonly label: string; readonly href?: string | undefined };

/** A stretch of work that was done with the camera off. */
export type RuleHatching = {
  readonly from: number;
  readonly to: number;
  /** The cut that it stands at, where it is not a stretch of the episode itself. */
  readonly at?: number | undefined;
  readonly label?: string | undefined;
};

export type RuleData = {
  /** Seconds. */
  readonly length: number;
  readonly balloons?: readonly RuleBalloon[] | undefined;
  readonly pops?: readonly RulePop[] | undefined;
  readonly chapters?: readonly RuleChapter[] | undefined;
  readonly hatchings?: readonly RuleHatching[] | undefined;
  readonly now?: number | undefined;
  /** The page lists the same beside the rule: it is not read out twice, and its links are for pointers only. */
  readonly quiet?: boolean | undefined;
};
