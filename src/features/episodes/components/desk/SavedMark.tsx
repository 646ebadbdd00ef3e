import { type AnyRow, faultsOf } from './desk-rows.ts';
import { markOf } from './desk-saving.ts';

type SavedMarkProps = {
  readonly row: AnyRow;
  readonly sending: string | null;
  readonly stalled: boolean;
  /** Says that it is saved too: while somebody has the row open. */
  readonly always?: boolean | undefined;
};

/** Whether a row is stored as it stands here. */
export function SavedMark({ row, sending, stalled, always = false }: SavedMarkProps) {
  const mark = markOf(row);
  if (mark === 'saved') return always ? <span className="text-sm text-verdigris">Saved</span> : null;
  if (mark === 'conflict') return <span className="text-sm font-medium text-primer">Two versions</span>;
  if (mark === 'waiting' && !stalled)
    return <span className="text-sm text-ink-soft">{sending === row.id ? 'Saving …' : 'Not saved yet'}</span>;
  return (
    <span className="text-sm font-medium text-primer">
      Not saved{stalled ? ': no connection' : `: ${whyNot(row)}`}
    </span>
  );
}

function whyNot(row: AnyRow): string {
  const fault = Object.values(faultsOf(row))[0] ?? Object.values(row.refused?.fields ?? {})[0];
  return fault ?? row.refused?.message ?? '';
}
