import { isCautionTopic } from '../../../../domain/cautions/topics.ts';
import { USUAL_CAUTIONS } from '../../../../domain/cautions/usual-cautions.ts';
import { GUARDED_KINDS } from '../../../../domain/note-kinds.ts';
import { type Note, type NoteFields } from '../../../notes/note.ts';
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

/** Whether the reader may change a note: on a published episode its numbers are the owner's. */
export function mayChangeNote(
  form: Pick<NoteFields, 'kind'>,
  note: Note | null,
  { mayChange, ownsNumbers, state }: Pick<DeskData, 'mayChange' | 'ownsNumbers' | 'state'>,
): boolean {
  if (!mayChange || ownsNumbers || state !== 'published') return mayChange;
  return note === null || note.proposed || !GUARDED_KINDS.includes(form.kind);
}
