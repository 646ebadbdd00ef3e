import { BothTexts } from '../../../../components/BothTexts.tsx';
import { Button } from '../../../../components/Button.tsx';
import { findDifferences } from '../../../../components/find-differences.ts';
import { type DeskData } from './desk-data.ts';
import { type AnyRow } from './desk-rows.ts';
import { settle } from './desk-saving.ts';
import { sayPlace } from './moment.ts';
import { useDesk } from './use-desk.ts';

const LABELS = {
  text: 'Words',
  title: 'Title',
  kind: 'Kind',
  parts: 'Parts',
  place: 'Where',
  audience: 'Seen by',
  asked: 'Asked',
  standing: 'The size is',
  topic: 'Caution about',
};

/** What was written here and what someone else stored meanwhile, and the choice between them. */
export function ConflictBox({ row }: { readonly row: AnyRow }) {
  const { data, change } = useDesk();
  const { conflict } = row;
  if (conflict === null) return null;
  return (
    <div role="alert" className="grid gap-3 border border-primer bg-primer-wash p-3">
      <p>
        Someone else {conflict.gone ? 'deleted' : 'saved'} this in the meantime
        {row.gone && ', and you deleted it'}. Both versions are kept. Choose one; you can go on changing it
        then.
      </p>
      {!conflict.gone && !row.gone && (
        <BothTexts
          differences={findDifferences(LABELS, textsOf(row.form, data), textsOf(conflict.form, data))}
        />
      )}
      <div className="flex flex-wrap gap-2">
        <Button
          size="small"
          onClick={() => {
            change((state) => settle(state, row.id, 'mine'));
          }}
        >
          {row.gone ? 'Delete it' : 'Take mine'}
        </Button>
        <Button
          size="small"
          onClick={() => {
            change((state) => settle(state, row.id, 'theirs'));
          }}
        >
          {conflict.gone ? 'Leave it deleted' : 'Take theirs'}
        </Button>
      </div>
    </div>
  );
}

function textsOf(form: AnyRow['form'], { parts, team }: DeskData): Record<keyof typeof LABELS, string> {
  const note = 'kind' in form ? form : null;
  const numbers = new Map(parts.map(({ id, number }) => [id, number]));
  return {
    text: note?.text ?? '',
    title: 'title' in form ? form.title : '',
    kind: note?.kind ?? '',
    parts: (note?.partIds ?? []).map((id) => numbers.get(id) ?? '?').join(', '),
    place: sayPlace(form.position),
    audience: note?.audience ?? '',
    asked: note?.audience === 'person' ? (team.find(({ id }) => id === note.askedId)?.name ?? '') : '',
    standing: note?.standing ?? '',
    topic: note?.topic ?? '',
  };
}
