import { fireEvent, render, screen } from '@testing-library/react';
import { Menu } from '@/features/ui';
import { windowWidth } from '../../support/window-width';

const onJson = jest.fn();
const onScript = jest.fn();

function Export() {
  return (
    <Menu
      label="Export"
      title="Export"
      items={[
        { key: 'json', label: 'JSON', onSelect: onJson },
        { key: 'csv', label: 'CSV', href: '/api/v1/orbits.csv', download: 'orbits.csv' },
        { key: 'script', label: 'Script', onSelect: onScript, disabledBecause: 'Withdrawn entries have no script.' },
      ]}
    />
  );
}

beforeEach(() => {
  onJson.mockClear();
  onScript.mockClear();
  windowWidth(1280);
});

const focused = () => document.activeElement?.textContent;

describe('Menu', () => {
  it('opens with the first item focused and walks around by the arrow keys', () => {
    render(<Export />);
    const opener = screen.getByRole('button', { name: /Export/ });
    fireEvent.click(opener);
    expect(opener.getAttribute('aria-expanded')).toBe('true');
    expect(focused()).toBe('JSON');
    fireEvent.keyDown(document.activeElement!, { key: 'ArrowUp' });
    expect(focused()).toBe('Script');
    fireEvent.keyDown(document.activeElement!, { key: 'ArrowDown' });
    expect(focused()).toBe('JSON');
    fireEvent.keyDown(document.activeElement!, { key: 'End' });
    expect(focused()).toBe('Script');
  });

  it('does what was chosen, closes, and gives the focus back', () => {
    render(<Export />);
    fireEvent.click(screen.getByRole('button', { name: /Export/ }));
    fireEvent.click(screen.getByRole('menuitem', { name: 'JSON' }));
    expect(onJson).toHaveBeenCalledTimes(1);
    expect(screen.queryByRole('menuitem')).toBeNull();
    expect(focused()).toContain('Export');
  });

  it('closes on Escape', () => {
    render(<Export />);
    fireEvent.click(screen.getByRole('button', { name: /Export/ }));
    fireEvent.keyDown(document.activeElement!, { key: 'Escape' });
    expect(screen.queryByRole('menuitem')).toBeNull();
  });

  it('does nothing for an item that can not be used, and says why', () => {
    render(<Export />);
    fireEvent.click(screen.getByRole('button', { name: /Export/ }));
    const item = screen.getByRole('menuitem', { name: /Script/ });
    fireEvent.click(item);
    expect(onScript).not.toHaveBeenCalled();
    expect(item.getAttribute('aria-disabled')).toBe('true');
    expect(item.title).toBe('Withdrawn entries have no script.');
  });

  it('is a sheet from below on a phone, with the first item focused', () => {
    windowWidth(390);
    render(<Export />);
    fireEvent.click(screen.getByRole('button', { name: /Export/ }));
    expect(screen.getByRole('dialog', { name: 'Export' })).toBeTruthy();
    expect(focused()).toBe('JSON');
    fireEvent.click(screen.getByRole('menuitem', { name: 'JSON' }));
    expect(onJson).toHaveBeenCalledTimes(1);
    expect(screen.queryByRole('dialog')).toBeNull();
  });
});
