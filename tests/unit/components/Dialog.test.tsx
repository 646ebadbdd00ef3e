import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { useState } from 'react';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { Dialog } from '../../../src/components/Dialog.tsx';

// jsdom has no modal dialogs; the browser's own part (focus, the page behind) is for the end-to-end spec.
beforeEach(() => {
  HTMLDialogElement.prototype.showModal = function showModal(this: HTMLDialogElement) {
    this.open = true;
  };
  HTMLDialogElement.prototype.close = function close(this: HTMLDialogElement) {
    this.open = false;
    this.dispatchEvent(new Event('close'));
  };
});
afterEach(cleanup);

function Asking() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button
        type="button"
        onClick={() => {
          setOpen(true);
        }}
      >
        Withdraw…
      </button>
      <p>{open ? 'asking' : 'not asking'}</p>
      <Dialog
        open={open}
        title="Withdraw episode 4?"
        onClose={() => {
          setOpen(false);
        }}
      >
        Viewers see that it was withdrawn.
      </Dialog>
    </>
  );
}

describe('the dialog', () => {
  it('is named by its title', async () => {
    render(<Asking />);
    await userEvent.click(screen.getByRole('button', { name: 'Withdraw…' }));
    expect(screen.getByRole('dialog', { name: 'Withdraw episode 4?' })).toBeTruthy();
  });

  it('closes with its close button', async () => {
    render(<Asking />);
    await userEvent.click(screen.getByRole('button', { name: 'Withdraw…' }));
    await userEvent.click(screen.getByRole('button', { name: 'Close' }));
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(screen.getByText('not asking')).toBeTruthy();
  });

  it('lets its owner close it when the browser is asked to (Escape)', async () => {
    render(<Asking />);
    await userEvent.click(screen.getByRole('button', { name: 'Withdraw…' }));
    fireEvent(screen.getByRole('dialog'), new Event('cancel', { cancelable: true }));
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(screen.getByText('not asking')).toBeTruthy();
  });
});
