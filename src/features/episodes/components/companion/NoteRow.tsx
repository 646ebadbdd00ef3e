import { Balloon } from '../../../../components/Balloon.tsx';
import { KindLabel } from '../../../../components/KindLabel.tsx';
import { NOTE_KINDS } from '../../../../components/note-kind.ts';
import { USUAL_CAUTIONS } from '../../../../domain/cautions/usual-cautions.ts';
import { formatClock } from '../../../../domain/time/format-clock.ts';
import { type CompanionNote, type CompanionPart } from '../../companion.ts';
import { NoteText, STANDING_WORDS } from './NoteText.tsx';
import { sayNumbers } from '../../../../domain/cautions/say-sources.ts';
import { TapeStretch } from './TapeStretch.tsx';

type NoteRowProps = {
  readonly note: CompanionNote;
  /** Of this note, in its order. */
  readonly parts: readonly CompanionPart[];
  readonly partNumbers: readonly string[];
  readonly href: string;
  readonly partHref: (id: string) => string;
  readonly worksheetHref: (id: string) => string;
  /** The second at which the row after it begins. */
  readonly next: number;
  /** Whether the tape begins or ends with this row. */
  readonly first: boolean;
  readonly last: boolean;
};

/** A note of the list: a small sheet beside the tape on narrow screens, a line of a table on wide ones. */
export function NoteRow(props: NoteRowProps) {
  const { note, parts, partNumbers, href, partHref, worksheetHref, next, first, last } = props;
  const caution = note.topic === null ? null : USUAL_CAUTIONS[note.topic];
  return (
    <li
      id={`note-${note.id}`}
      data-note=""
      data-row-at={note.at}
      className="relative border-b border-line py-3 ps-20 aria-current:bg-brass-wash lg:grid lg:grid-cols-[4.5rem_minmax(0,1fr)_auto] lg:gap-x-4 lg:border-s-4 lg:border-s-transparent lg:ps-3 lg:pe-2 lg:aria-current:border-s-brass"
    >
      <div className="lg:hidden" aria-hidden="true">
        <TapeStretch from={note.at} to={next} tone={NOTE_KINDS[note.kind].tone} first={first} last={last} />
      </div>
      <p className="flex flex-wrap items-center gap-x-2 gap-y-1 lg:contents">
        <a
          data-at={note.at}
          href={href}
          className="-my-1 py-1 font-mono font-semibold text-dye hover:underline lg:row-span-3 lg:my-0 lg:py-0"
        >
          {formatClock(note.at)}
        </a>
        <span className="flex flex-wrap items-center gap-2">
          <KindLabel kind={note.kind} />
          {note.standing !== null && (
            <span className="text-sm text-ink-soft">{STANDING_WORDS[note.standing]}</span>
          )}
        </span>
        {parts.length > 0 && (
          <span className="ms-auto flex flex-wrap justify-end gap-1.5 max-lg:pe-1 lg:row-span-3 lg:max-w-40">
            {parts.map(({ id, number, name, inPlans }) => (
              <Balloon key={id} number={number} name={name} dashed={!inPlans} href={partHref(id)} />
            ))}
          </span>
        )}
      </p>
      <p className="mt-1 max-w-prose whitespace-pre-line lg:col-start-2">
        <NoteText text={note.text} standing={note.standing} partNumbers={partNumbers} />
      </p>
      {note.result !== null && (
        <p className="mt-1 max-w-prose text-sm lg:col-start-2">
          <span className="font-mono">
            {note.result.what}: {note.result.said}
          </span>
          {note.result.worksheet !== null && (
            <>
              {' · '}
              <a href={worksheetHref(note.result.worksheet.id)} className="link">
                {note.result.worksheet.title}
              </a>
            </>
          )}
        </p>
      )}
      {caution !== null && (
        <p className="mt-1 max-w-prose text-sm text-ink-soft lg:col-start-2">
          <a href={`#caution-${note.topic ?? ''}`} className="link">
            {`The usual caution: ${caution.label}`}
          </a>
          {`. Source: ${sayNumbers(caution.sources)}.`}
        </p>
      )}
    </li>
  );
}
