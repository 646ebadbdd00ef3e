import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { Field } from '../../../../components/Field.tsx';
import { type Note, NOTE_TEXT_LENGTH } from '../../../notes/note.ts';
import { answerNoteMutation, takeProposalMutation } from '../../queries.ts';
import { takeNote } from './desk-saving.ts';
import { useDesk } from './use-desk.ts';

/** The answer to a note that asks one person: they write it in place, and so may the owner. */
export function NoteAnswer({ note }: { readonly note: Note }) {
  const { data, change } = useDesk();
  const [text, setText] = useState(note.answer ?? '');
  const { mutate, isPending, error } = useMutation({
    ...answerNoteMutation(data),
    onSuccess: (saved) => {
      change((state) => takeNote(state, saved));
    },
  });
  if (note.audience !== 'person' || (note.asked?.id !== data.me && !data.ownsNumbers)) return null;
  const mine = note.asked?.id === data.me;
  if (!mine && note.answer !== null) return null;
  return (
    <form
      className="grid max-w-prose gap-2 border-s-4 border-brass ps-3"
      onSubmit={(event) => {
        event.preventDefault();
        mutate({ id: note.id, version: note.version, answer: text });
      }}
    >
      <Field
        label={mine ? 'Your answer' : `Answer for ${note.asked?.name ?? 'them'}`}
        name={`answer-${note.id}`}
        rows={2}
        required
        maxLength={NOTE_TEXT_LENGTH}
        value={text}
        error={error?.message}
        onChange={(event) => {
          setText(event.target.value);
        }}
      />
      <div>
        <Button size="small" type="submit" disabled={isPending || text.trim() === '' || text === note.answer}>
          {note.answer === null ? 'Answer' : 'Change the answer'}
        </Button>
      </div>
    </form>
  );
}

/** An editor's proposal on a published episode: the owner takes it or drops it. */
export function NoteProposal({ note, onDrop }: { readonly note: Note; readonly onDrop: () => void }) {
  const { data, change } = useDesk();
  const { mutate, isPending, error } = useMutation({
    ...takeProposalMutation(data),
    onSuccess: (saved) => {
      change((state) => takeNote(state, saved));
    },
  });
  if (!note.proposed) return null;
  return (
    <div className="flex flex-wrap items-center gap-2 border-s-4 border-brass ps-3 text-sm">
      <p>
        Proposed by {note.writtenBy ?? 'someone'}; viewers do not see it
        {data.ownsNumbers ? '.' : ' until the owner takes it.'}
      </p>
      {data.ownsNumbers && (
        <>
          <Button
            size="small"
            variant="primary"
            disabled={isPending}
            onClick={() => {
              mutate({ id: note.id, version: note.version });
            }}
          >
            Take it
          </Button>
          <Button size="small" onClick={onDrop}>
            Drop it
          </Button>
        </>
      )}
      {error && (
        <p role="alert" className="text-primer">
          {error.message}
        </p>
      )}
    </div>
  );
}
