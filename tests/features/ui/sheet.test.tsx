import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { Button, Field, Sheet } from '@/features/ui';

function Filters({ onClose = () => undefined }: { onClose?: () => void }) {
  const [open, setOpen] = useState(false);
  const close = () => {
    setOpen(false);
    onClose();
  };
  return (
    <div id="root">
      <Button onPress={() => setOpen(true)}>Filters</Button>
      <Sheet open={open} onClose={close} title="Narrow the search" footer={<Button onPress={close}>Cancel</Button>}>
        <Field label="Period" value="" onChangeText={() => undefined} />
      </Sheet>
    </div>
  );
}

const open = () => {
  const opener = screen.getByRole('button', { name: 'Filters' });
  opener.focus();
  fireEvent.click(opener);
  return opener;
};

describe('Sheet', () => {
  it('is a dialog named by its heading, takes the focus and makes the page behind it inert', () => {
    render(<Filters />);
    open();
    const sheet = screen.getByRole('dialog', { name: 'Narrow the search' });
    expect(sheet.contains(document.activeElement)).toBe(true);
    expect(document.getElementById('root')?.hasAttribute('inert')).toBe(true);
  });

  it('keeps Tab inside, both ways', () => {
    render(<Filters />);
    open();
    const [field, cancel] = [screen.getByLabelText('Period'), screen.getByRole('button', { name: 'Cancel' })];
    cancel.focus();
    fireEvent.keyDown(cancel, { key: 'Tab' });
    expect(document.activeElement).toBe(field);
    fireEvent.keyDown(field, { key: 'Tab', shiftKey: true });
    expect(document.activeElement).toBe(cancel);
  });

  it('closes on Escape and gives the focus back', () => {
    const onClose = jest.fn();
    render(<Filters onClose={onClose} />);
    const opener = open();
    fireEvent.keyDown(document.activeElement!, { key: 'Escape' });
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(onClose).toHaveBeenCalledTimes(1);
    expect(document.activeElement).toBe(opener);
    expect(document.getElementById('root')?.hasAttribute('inert')).toBe(false);
  });

  it('closes on a press beside it, not on one inside', () => {
    render(<Filters />);
    open();
    const sheet = screen.getByRole('dialog');
    fireEvent.mouseDown(sheet);
    expect(screen.queryByRole('dialog')).not.toBeNull();
    fireEvent.mouseDown(sheet.parentElement!);
    expect(screen.queryByRole('dialog')).toBeNull();
  });
});
