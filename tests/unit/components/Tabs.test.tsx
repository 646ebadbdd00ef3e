import { cleanup, render, screen } from '@testing-library/react';
import { userEvent } from '@testing-library/user-event';
import { renderToString } from 'react-dom/server';
import { afterEach, describe, expect, it } from 'vitest';
import { Tabs } from '../../../src/components/Tabs.tsx';

afterEach(cleanup);

const tabs = [
  { id: 'film', label: 'Filmed', content: <p>from 3:40</p> },
  { id: 'sizes', label: 'Sizes', content: <p>72 H7</p> },
  { id: 'orders', label: 'Orders', content: <p>none</p> },
];

describe('tabs', () => {
  it('show every sheet in the HTML of the server, with links to them', () => {
    const html = renderToString(<Tabs label="Views" tabs={tabs} />);
    for (const words of ['from 3:40', '72 H7', 'none']) expect(html).toContain(words);
    expect(html.match(/href="#/g)).toHaveLength(3);
    expect(html).not.toContain('role="tab"');
  });

  it('show the first sheet, or the one asked for', () => {
    render(<Tabs label="Views" tabs={tabs} initial="sizes" />);
    expect(screen.getByRole('tabpanel').textContent).toBe('72 H7');
  });

  it('move with the arrows, round both ends, and with Home and End', async () => {
    const user = userEvent.setup();
    render(<Tabs label="Views" tabs={tabs} />);
    await user.click(screen.getByRole('tab', { name: 'Filmed' }));
    await user.keyboard('{ArrowLeft}');
    expect(document.activeElement).toBe(screen.getByRole('tab', { name: 'Orders' }));
    expect(screen.getByRole('tabpanel').textContent).toBe('none');
    await user.keyboard('{ArrowRight}');
    expect(screen.getByRole('tabpanel').textContent).toBe('from 3:40');
    await user.keyboard('{End}');
    expect(screen.getByRole('tabpanel').textContent).toBe('none');
  });

  it('are one stop of the Tab key, which then leads into the sheet', async () => {
    const user = userEvent.setup();
    render(<Tabs label="Views" tabs={tabs} />);
    await user.tab();
    expect(document.activeElement).toBe(screen.getByRole('tab', { name: 'Filmed' }));
    await user.tab();
    expect(document.activeElement).toBe(screen.getByRole('tabpanel'));
  });
});
