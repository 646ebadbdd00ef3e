import { Field } from '../../../../components/Field.tsx';
import { Segments } from '../../../../components/Segments.tsx';
import { Select } from '../../../../components/Select.tsx';
import { CAUTION_TOPICS, isCautionTopic } from '../../../../domain/cautions/topics.ts';
import { USUAL_CAUTIONS } from '../../../../domain/cautions/usual-cautions.ts';
import { NOTE_AUDIENCES, SIZE_STANDINGS } from '../../../../domain/note-kinds.ts';
import { NOTE_TEXT_LENGTH, type NoteFields as Fields } from '../../../notes/note.ts';
import { withKind } from './composer-draft.ts';
import { type DeskData } from './desk-data.ts';
import { KindField } from './KindField.tsx';
import { PartsField } from './PartsField.tsx';

export type Written = Omit<Fields, 'position'>;

type NoteFieldsProps = {
  /** Made part of every id in it. */
  readonly name: string;
  readonly data: DeskData;
  readonly note: Written;
  readonly errors: Readonly<Record<string, string>>;
  readonly onChange: (fields: Partial<Written>) => void;
  readonly onSave: () => void;
};

const AUDIENCES = { viewers: 'Viewers', team: 'The team', person: 'One person, asked' };
const STANDINGS = { plan: 'plan', 'as-made': 'as made', 'as-said': 'as said' };

/** What is written of a note, wherever it is written. */
export function NoteFields({ name, data, note, errors, onChange, onSave }: NoteFieldsProps) {
  const usual = isCautionTopic(note.topic) ? USUAL_CAUTIONS[note.topic] : null;
  return (
    <div className="grid gap-3">
      <KindField
        name={name}
        kind={note.kind}
        onChange={(kind) => {
          const { standing, topic } = withKind(note, kind);
          onChange({ kind, standing, topic });
        }}
      />
      {note.kind === 'caution' && (
        <Select
          label="The usual caution about"
          name={`${name}-topic`}
          id={`${name}-topic`}
          value={note.topic ?? ''}
          options={[
            { value: '', label: 'none of these' },
            ...CAUTION_TOPICS.map((topic) => ({ value: topic, label: USUAL_CAUTIONS[topic].label })),
          ]}
          onChange={({ target }) => {
            const topic = isCautionTopic(target.value) ? target.value : null;
            const before = usual?.words ?? '';
            const empty = note.text === '' || note.text === before;
            onChange({ topic, ...(topic && empty && { text: USUAL_CAUTIONS[topic].words }) });
          }}
        />
      )}
      <Field
        label="Words"
        name={`${name}-text`}
        id={`${name}-text`}
        rows={3}
        required
        maxLength={NOTE_TEXT_LENGTH}
        value={note.text}
        error={errors['text']}
        onChange={(event) => {
          onChange({ text: event.target.value });
        }}
        onKeyDown={(event) => {
          if (event.key !== 'Enter' || !(event.ctrlKey || event.metaKey)) return;
          event.preventDefault();
          onSave();
        }}
      />
      {usual && (
        <p className="text-sm text-ink-soft">
          Source: {usual.sources.map(({ title, number }) => `${title}, ${number}`).join('; ')}. Local codes
          and licensed people come first.
        </p>
      )}
      {note.kind === 'size' && (
        <Segments
          key={`standing-${note.standing ?? ''}`}
          label="The size is"
          name={`${name}-standing`}
          value={note.standing ?? ''}
          options={SIZE_STANDINGS.map((value) => ({ value, label: STANDINGS[value] }))}
          onChange={(value) => {
            onChange({ standing: SIZE_STANDINGS.find((one) => one === value) ?? null });
          }}
        />
      )}
      <PartsField
        name={name}
        parts={data.parts}
        chosen={note.partIds}
        error={errors['partIds']}
        onChange={(partIds) => {
          onChange({ partIds: [...partIds] });
        }}
      />
      <Segments
        key={`audience-${note.audience}`}
        label="Seen by"
        name={`${name}-audience`}
        value={note.audience}
        options={NOTE_AUDIENCES.map((value) => ({ value, label: AUDIENCES[value] }))}
        onChange={(value) => {
          onChange({ audience: NOTE_AUDIENCES.find((one) => one === value) ?? 'team' });
        }}
      />
      {note.audience === 'person' && (
        <Select
          label="Who is asked"
          name={`${name}-asked`}
          id={`${name}-asked`}
          required
          hint="It waits in their Today, and holds the episode back until they answer."
          value={note.askedId ?? ''}
          error={errors['askedId']}
          options={[
            { value: '', label: 'choose' },
            ...data.team.map((person) => ({ value: person.id, label: person.name })),
          ]}
          onChange={({ target }) => {
            onChange({ askedId: target.value === '' ? null : target.value });
          }}
        />
      )}
    </div>
  );
}
