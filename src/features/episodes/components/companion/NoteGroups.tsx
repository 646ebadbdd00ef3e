import { formatClock } from '../../../../domain/time/format-clock.ts';
import { paths } from '../../../../paths.ts';
import { type Companion, type CompanionChapter } from '../../companion.ts';
import { groupNotes } from './list-rows.ts';
import { NoteRow } from './NoteRow.tsx';
import { ruleLength } from './rule-marks.ts';
import { TapeStretch } from './TapeStretch.tsx';
import { timeAddress } from './video-times.ts';

/** The notes of an episode under their chapters. One component, because a render of each row by itself is slow. */
export function NoteGroups({
  companion,
  workshop,
}: {
  readonly companion: Companion;
  readonly workshop: string;
}) {
  const { notes, chapters, parts, video } = companion;
  const groups = groupNotes(notes, chapters, ruleLength(companion));
  const byId = new Map(parts.map((part) => [part.id, part]));
  const partNumbers = parts.map(({ number }) => number);
  return groups.map(({ chapter, next, rows }, group) => {
    const isLast = group === groups.length - 1;
    return (
      <section
        key={chapter?.id ?? ''}
        aria-labelledby={chapter === null ? undefined : `chapter-${chapter.id}`}
      >
        {chapter !== null && (
          <ChapterRow
            chapter={chapter}
            href={timeAddress(video, chapter.at)}
            next={next}
            first={group === 0}
            last={isLast && rows.length === 0}
          />
        )}
        {rows.length > 0 && (
          <ol>
            {rows.map(({ note, next: after }, row) => (
              <NoteRow
                key={note.id}
                note={note}
                parts={note.partIds.flatMap((id) => byId.get(id) ?? [])}
                partNumbers={partNumbers}
                href={timeAddress(video, note.at)}
                partHref={(id) => paths.part(workshop, companion.build.slug, id)}
                worksheetHref={(id) => paths.keptWorksheet(workshop, companion.build.slug, id)}
                next={after}
                first={group === 0 && row === 0 && chapter === null}
                last={isLast && row === rows.length - 1}
              />
            ))}
          </ol>
        )}
      </section>
    );
  });
}

type ChapterRowProps = {
  readonly chapter: CompanionChapter;
  readonly href: string;
  readonly next: number;
  readonly first: boolean;
  readonly last: boolean;
};

function ChapterRow({ chapter, href, next, first, last }: ChapterRowProps) {
  return (
    <div
      data-row-at={chapter.at}
      className="relative flex items-baseline gap-x-4 border-b border-ink py-3 ps-20 lg:ps-4 lg:pt-5"
    >
      <div className="pointer-events-none absolute inset-0 lg:hidden" aria-hidden="true">
        <TapeStretch from={chapter.at} to={next} tone={null} first={first} last={last} />
      </div>
      <a
        data-at={chapter.at}
        href={href}
        aria-label={`${chapter.title}, from ${formatClock(chapter.at)}`}
        className="-my-1 py-1 font-mono font-semibold text-dye hover:underline lg:w-18"
      >
        {formatClock(chapter.at)}
      </a>
      <h3 id={`chapter-${chapter.id}`}>{chapter.title}</h3>
    </div>
  );
}
