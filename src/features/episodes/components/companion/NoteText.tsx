import { DimensionLine } from '../../../../components/DimensionLine.tsx';
import { findSizes } from '../../../../domain/lengths/find-sizes.ts';
import { type SizeStanding } from '../../../../domain/note-kinds.ts';
import { describeSize } from './describe-size.ts';

type NoteTextProps = {
  readonly text: string;
  readonly standing?: SizeStanding | null | undefined;
  /** The build's part numbers, which are never sizes. */
  readonly partNumbers: readonly string[];
};

export const STANDING_WORDS = { plan: 'plan', 'as-made': 'as made', 'as-said': 'as said' } as const;

/** The words of a note, its sizes as dimension lines in the reader's units. */
export function NoteText({ text, standing, partNumbers }: NoteTextProps) {
  const sizes = findSizes(text, { names: partNumbers });
  const ends = [0, ...sizes.map(({ end }) => end)];
  const origin = standing ? STANDING_WORDS[standing] : undefined;
  return (
    <>
      {sizes.map((size, index) => (
        <span key={size.start}>
          {text.slice(ends[index], size.start)}
          <DimensionLine {...describeSize(size)} origin={origin} />
        </span>
      ))}
      {text.slice(ends.at(-1))}
    </>
  );
}
