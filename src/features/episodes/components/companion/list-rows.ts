import { type CompanionChapter, type CompanionNote } from '../../companion.ts';

/** A note of the list, with the second at which the row after it begins. */
export interface NoteRowData {
  readonly note: CompanionNote;
  readonly next: number;
}

/** The notes of a chapter; without one, those before the first. */
export interface NoteGroup {
  readonly chapter: CompanionChapter | null;
  /** Where the row after the chapter's own begins, in seconds. */
  readonly next: number;
  readonly rows: readonly NoteRowData[];
}

/** Notes under their chapters, in the order of the episode. @param length seconds that the tape ends at */
export function groupNotes(
  notes: readonly CompanionNote[],
  chapters: readonly CompanionChapter[],
  length: number,
): NoteGroup[] {
  const starts = [null, ...chapters];
  const groups = starts.map((chapter, index) => ({
    chapter,
    notes: notes.filter(
      ({ from }) =>
        from >= (chapter?.from ?? Number.NEGATIVE_INFINITY) &&
        from < (starts[index + 1]?.from ?? Number.POSITIVE_INFINITY),
    ),
  }));
  const shown = groups.filter(({ chapter, notes: own }) => chapter !== null || own.length > 0);
  return shown.map(({ chapter, notes: own }, index) => {
    const after = shown[index + 1];
    const end = after?.chapter?.at ?? after?.notes[0]?.at ?? length;
    return {
      chapter,
      next: own[0]?.at ?? end,
      rows: own.map((note, row) => ({ note, next: own[row + 1]?.at ?? end })),
    };
  });
}
