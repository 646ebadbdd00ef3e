import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { renderToString } from 'react-dom/server';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Combobox } from '../../../src/components/Combobox.tsx';

const options = [
  { value: 'p117', label: '117', detail: 'drum shaft' },
  { value: 'p118', label: '118', detail: 'bearing housing' },
  { value: 'p124', label: '124', detail: 'cylinder' },
];

// jsdom lays nothing out and so has no scrolling.
beforeEach(() => {
  Element.prototype.scrollIntoView = () => undefined;
});
afterEach(cleanup);

function sent(container: HTMLElement): string | undefined {
  return container.querySelector<HTMLInputElement>('input[type=hidden]')?.value;
}

describe('the type-ahead', () => {
  it('is a native list in the HTML of the server', () => {
    const html = renderToString(<Combobox label="Part" name="part" options={options} value="p118" />);
    expect(html).toContain('<select');
    expect(html).toContain('118 · bearing housing');
  });

  it('narrows to what is typed and takes it with Enter', async () => {
    const user = userEvent.setup();
    const onChange = vi.fn();
    const { container } = render(<Combobox label="Part" name="part" options={options} onChange={onChange} />);
    const input = screen.getByRole('combobox', { name: /Part/ });
    await user.type(input, 'bear');
    expect(screen.getAllByRole('option')).toHaveLength(1);
    await user.keyboard('{ArrowDown}{Enter}');
    expect((input as HTMLInputElement).value).toBe('118');
    expect(sent(container)).toBe('p118');
    expect(onChange).toHaveBeenCalledExactlyOnceWith('p118');
    expect(input.getAttribute('aria-expanded')).toBe('false');
  });

  it('moves through the list with the arrows, round both ends, and says where it is', async () => {
    const user = userEvent.setup();
    render(<Combobox label="Part" name="part" options={options} />);
    const input = screen.getByRole('combobox');
    await user.click(input);
    await user.keyboard('{ArrowUp}');
    const last = screen.getAllByRole('option').at(-1);
    expect(input.getAttribute('aria-activedescendant')).toBe(last?.id);
    await user.keyboard('{ArrowDown}');
    expect(input.getAttribute('aria-activedescendant')).toBe(screen.getAllByRole('option')[0]?.id);
  });

  it('closes with Escape first and only then empties', async () => {
    const user = userEvent.setup();
    const { container } = render(<Combobox label="Part" name="part" options={options} value="p118" />);
    const input = screen.getByRole('combobox');
    await user.click(input);
    await user.keyboard('{Escape}');
    expect(input.getAttribute('aria-expanded')).toBe('false');
    expect(sent(container)).toBe('p118');
    await user.keyboard('{Escape}');
    expect(sent(container)).toBe('');
  });

  it('puts back what was chosen when something else was typed and left', async () => {
    const user = userEvent.setup();
    const { container } = render(<Combobox label="Part" name="part" options={options} value="p118" />);
    const input = screen.getByRole<HTMLInputElement>('combobox');
    await user.clear(input);
    await user.type(input, 'gearbox');
    expect(screen.getByText('Nothing here with “gearbox” in it.')).toBeTruthy();
    await user.tab();
    expect(input.value).toBe('118');
    expect(sent(container)).toBe('p118');
  });

  it('takes what is pressed with the pointer', async () => {
    const user = userEvent.setup();
    const { container } = render(<Combobox label="Part" name="part" options={options} />);
    await user.click(screen.getByRole('combobox'));
    await user.click(screen.getByText('cylinder'));
    expect(sent(container)).toBe('p124');
  });
});
