import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Menu } from '../../../src/components/Menu.tsx';

afterEach(cleanup);

function showMenu(onSelect = vi.fn()) {
  render(
    <Menu
      label="More"
      items={[{ label: 'Move' }, { label: 'Open', href: '/parts' }, { label: 'Scrap', onSelect }]}
    />,
  );
  return { user: userEvent.setup(), button: screen.getByRole('button', { name: 'More' }), onSelect };
}

const focused = () => document.activeElement?.textContent;

describe('the menu', () => {
  it('opens on its first entry with the down arrow and on its last with the up arrow', async () => {
    const { user, button } = showMenu();
    button.focus();
    await user.keyboard('{ArrowDown}');
    expect(focused()).toBe('Move');
    await user.keyboard('{Escape}{ArrowUp}');
    expect(focused()).toBe('Scrap');
  });

  it('goes round with the arrows and to its ends with Home and End', async () => {
    const { user, button } = showMenu();
    await user.click(button);
    await user.keyboard('{ArrowUp}');
    expect(focused()).toBe('Scrap');
    await user.keyboard('{ArrowDown}');
    expect(focused()).toBe('Move');
    await user.keyboard('{End}');
    expect(focused()).toBe('Scrap');
    await user.keyboard('{Home}');
    expect(focused()).toBe('Move');
  });

  it('goes to the entry that starts with the letter', async () => {
    const { user, button } = showMenu();
    await user.click(button);
    await user.keyboard('s');
    expect(focused()).toBe('Scrap');
  });

  it('does what is chosen, closes and gives focus back to its button', async () => {
    const { user, button, onSelect } = showMenu();
    await user.click(button);
    await user.keyboard('{End}{Enter}');
    expect(onSelect).toHaveBeenCalledOnce();
    expect(screen.queryByRole('menu')).toBeNull();
    expect(document.activeElement).toBe(button);
  });

  it('closes with Escape, with Tab and with a press elsewhere', async () => {
    const { user, button } = showMenu();
    await user.click(button);
    await user.keyboard('{Escape}');
    expect(screen.queryByRole('menu')).toBeNull();
    await user.click(button);
    await user.tab();
    expect(screen.queryByRole('menu')).toBeNull();
    await user.click(button);
    await user.click(document.body);
    expect(screen.queryByRole('menu')).toBeNull();
    expect(button.getAttribute('aria-expanded')).toBe('false');
  });
});
