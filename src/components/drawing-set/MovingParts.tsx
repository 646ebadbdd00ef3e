import { useCallback, useState } from 'react';
import { Button } from '../Button.tsx';
import { Combobox } from '../Combobox.tsx';
import { Dialog } from '../Dialog.tsx';
import { Menu } from '../Menu.tsx';
import { SizeField } from '../SizeField.tsx';
import { Tabs } from '../Tabs.tsx';
import { type Toast, Toasts } from '../Toasts.tsx';

const PARTS = [
  { value: '117', label: '117', detail: 'drum shaft' },
  { value: '118', label: '118', detail: 'bearing housing' },
  { value: '119', label: '119', detail: 'ball bearing' },
  { value: '124', label: '124', detail: 'cylinder' },
  { value: '125', label: '125', detail: 'port adapter' },
];

function readMillimetres(text: string): string | null {
  const value = Number(text.replace(/\s*mm$/, ''));
  return Number.isFinite(value) ? `${String(value)} mm · ${(value / 25.4).toFixed(3)} in` : null;
}

/** The parts that need a browser, working. */
export function MovingParts() {
  const [asking, setAsking] = useState(false);
  const [toasts, setToasts] = useState<readonly Toast[]>([]);
  const dismiss = useCallback((id: string) => {
    setToasts((current) => current.filter((toast) => toast.id !== id));
  }, []);
  const say = (toast: Omit<Toast, 'id'>) => {
    setToasts((current) => [...current, { ...toast, id: String(performance.now()) }]);
  };
  return (
    <div className="grid gap-6">
      <div className="grid gap-6 sm:grid-cols-2">
        <Combobox
          label="Part"
          name="part"
          options={PARTS}
          value="118"
          required
          hint="Type a number or a name."
        />
        <SizeField label="As measured" name="measured" value="35.009" required read={readMillimetres} />
      </div>
      <div className="flex flex-wrap gap-3">
        <Menu
          label="More"
          items={[
            { label: 'Move to another clip' },
            { label: 'Open the part', href: '#parts' },
            {
              label: 'Withdraw the episode',
              danger: true,
              onSelect: () => {
                setAsking(true);
              },
            },
          ]}
        />
        <Button
          onClick={() => {
            setAsking(true);
          }}
        >
          Withdraw…
        </Button>
        <Button
          onClick={() => {
            say({ tone: 'done', text: 'Note added at 3:40.' });
          }}
        >
          Say that it is done
        </Button>
        <Button
          onClick={() => {
            say({
              tone: 'error',
              text: 'The note was not sent. It is kept on this device.',
              action: { label: 'Send again', onSelect: () => undefined },
            });
          }}
        >
          Say that it went wrong
        </Button>
      </div>
      <Tabs
        label="Views of the part"
        tabs={[
          { id: 'film', label: 'Where it is filmed', content: <p>Episode 4, from 3:40 to 5:02.</p> },
          { id: 'sizes', label: 'Sizes', content: <p>Bore 72 H7, as made 72.012 mm.</p> },
          { id: 'orders', label: 'Orders', content: <p>Made in the shop; nothing ordered.</p> },
        ]}
      />
      <Dialog
        open={asking}
        title="Withdraw episode 4?"
        onClose={() => {
          setAsking(false);
        }}
        actions={
          <>
            <Button
              variant="danger"
              onClick={() => {
                setAsking(false);
              }}
            >
              Withdraw episode 4
            </Button>
            <Button
              onClick={() => {
                setAsking(false);
              }}
            >
              Keep it up
            </Button>
          </>
        }
      >
        <p>Viewers see that it was withdrawn. Its notes, questions and plans stay with you.</p>
      </Dialog>
      <Toasts toasts={toasts} onDismiss={dismiss} />
    </div>
  );
}
