import { isCautionTopic } from '../../../../domain/cautions/topics.ts';
import { USUAL_CAUTIONS } from '../../../../domain/cautions/usual-cautions.ts';
import { GUARDED_KINDS } from '../../../../domain/note-kinds.ts';
import { formatClock } from '../../../../domain/time/format-clock.ts';
import { type Note, type NoteFields, type Place } from '../../../notes/note.ts';
import { type DeskData } from './desk-data.ts';

const STANDINGS = { plan: 'As the plan says', 'as-made': 'As made', 'as-said': 'As said' };

/** The line under a note: what its size is, who sees it, who is asked. */
export function sayUnder(form: NoteFields, note: Note | null, { team }: Pick<DeskData, 'team'>): string {
  const asked = team.find(({ id }) => id === form.askedId)?.name ?? note?.asked?.name ?? 'someone';
  const waits = note?.answer === null ? `Asked of ${asked} · holds the episode back` : `Asked of ${asked}`;
  const seen = { viewers: 'shown to viewers', team: 'for the team', person: waits }[form.audience];
  const said = [
    form.kind === 'size' && form.standing !== null && STANDINGS[form.standing],
    form.kind === 'caution' &&
      isCautionTopic(form.topic) &&
      `Usual caution: ${USUAL_CAUTIONS[form.topic].label}`,
    seen,
  ].filter((piece) => piece !== false);
  const line = said.join(' · ');
  return line.charAt(0).toUpperCase() + line.slice(1);
}

/** What has to be said of where something comes in the edit; empty where it simply comes there. */
export function sayInEdit(place: Place | null): string {
  if (place === null) return '';
  const { status, toEdge, byPicture, also, on } = place;
  const said = [
    status === 'snapped' && 'Its moment is not in this edit: moved to the nearest that is.',
    toEdge && `No clip was running: moved to the edge of ${on?.clip ?? 'the nearest clip'}.`,
    byPicture && 'Its sound has no track in this edit: placed by the picture.',
    also.length > 0 && `Also at ${also.map(formatClock).join(', ')}.`,
  ];
  return said.filter((piece) => piece !== false).join(' ');
}

/** Why something is not in this edit, with the segment that was dropped. */
export function sayWhyLost(place: Place | null): string {
  if (place?.status === 'no-footage')
    return place.on === null
      ? 'No clip was running when it was noted.'
      : `No clip was running when it was noted. The nearest is ${place.on.clip}.`;
  if (place?.dropped != null) return `The edit before used it in ${place.dropped}. That is not in this edit.`;
  const where = place?.on == null ? '' : ` ${place.on.clip} at ${formatClock(Math.max(0, place.on.at))}:`;
  return `${where} this moment is not in this edit.`.trim();
}

/** Whether the reader may change a note: on a published episode its numbers are the owner's. */
export function mayChangeNote(
  form: Pick<NoteFields, 'kind'>,
  note: Note | null,
  { mayChange, ownsNumbers, state }: Pick<DeskData, 'mayChange' | 'ownsNumbers' | 'state'>,
): boolean {
  if (!mayChange || ownsNumbers || state !== 'published') return mayChange;
  return note === null || note.proposed || !GUARDED_KINDS.includes(form.kind);
}
