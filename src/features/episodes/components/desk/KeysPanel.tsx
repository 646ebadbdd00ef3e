import { Button } from '../../../../components/Button.tsx';
import { Dialog } from '../../../../components/Dialog.tsx';
import { KEY_GROUPS } from './desk-keys.ts';

type KeysPanelProps = {
  readonly open: boolean;
  readonly onClose: () => void;
  /** Whether keys without Ctrl do anything. */
  readonly singles: boolean;
  readonly onSingles: (on: boolean) => void;
};

/** Every key of the desk. */
export function KeysPanel({ open, onClose, singles, onSingles }: KeysPanelProps) {
  return (
    <Dialog open={open} onClose={onClose} title="Keys" actions={<Button onClick={onClose}>Close</Button>}>
      <div className="grid gap-4">
        {KEY_GROUPS.map(({ title, keys }) => (
          <section key={title} className="grid gap-1">
            <h3>{title}</h3>
            <dl className="grid grid-cols-[9rem_1fr] gap-x-3 gap-y-1">
              {keys.map(([key, does]) => (
                <div key={key} className="contents">
                  <dt className="font-mono font-semibold">{key}</dt>
                  <dd>{does}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
        <p className="text-sm text-ink-soft">
          While you type in a field only Ctrl Enter and Esc do what stands here; Ctrl Z then takes back
          typing.
        </p>
        <label className="flex min-h-8 items-center gap-3">
          <input
            type="checkbox"
            className="size-5 accent-dye"
            checked={singles}
            onChange={(event) => {
              onSingles(event.target.checked);
            }}
          />
          Use the keys that need no Ctrl
        </label>
      </div>
    </Dialog>
  );
}
