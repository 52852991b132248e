import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Tabs } from '@/features/ui';

const tabs = [
  { key: 'check', label: 'Check an orbit' },
  { key: 'search', label: 'Search for close returns' },
  { key: 'drafts', label: 'Drafts', count: 2 },
] as const;

function Bench() {
  const [active, setActive] = useState<(typeof tabs)[number]['key']>('check');
  return (
    <Tabs name="Bench" tabs={tabs} active={active} onChange={setActive}>
      panel of {active}
    </Tabs>
  );
}

describe('Tabs', () => {
  it('names the panel by its tab and keeps one tab in the order of focus', () => {
    render(<Bench />);
    expect(screen.getByRole('tabpanel', { name: 'Check an orbit' }).textContent).toBe('panel of check');
    expect(screen.getAllByRole('tab').map((tab) => tab.tabIndex)).toEqual([0, -1, -1]);
  });

  it.each([
    ['ArrowRight', 'panel of search'],
    ['ArrowLeft', 'panel of drafts'],
    ['End', 'panel of drafts'],
  ])('%s moves on and takes the focus with it', (key, text) => {
    render(<Bench />);
    fireEvent.keyDown(screen.getByRole('tab', { selected: true }), { key });
    expect(screen.getByRole('tabpanel').textContent).toBe(text);
    expect(document.activeElement).toBe(screen.getByRole('tab', { selected: true }));
  });
});
