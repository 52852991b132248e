import { fireEvent, render, screen } from '@testing-library/react';
import { Figure } from '@/features/plot/figure';
import { laidOut, settled } from '../../support/laid-out';

const table = {
  columns: [
    { key: 'number', head: 'No.' },
    { key: 'time', head: 't' },
  ],
  rows: [
    { key: '0', cells: { number: 1, time: '0' } },
    { key: '1', cells: { number: 2, time: '0.66' } },
  ],
};

beforeAll(() => laidOut(320));

describe('Figure', () => {
  it('swaps its picture for a table in place and back, and selects from the table', async () => {
    const onSelect = jest.fn();
    render(
      <Figure
        title="z against time"
        name="z against time"
        caption="Two crossings."
        table={table}
        data={[1]}
        fileName="z"
        onSelect={onSelect}
      >
        {({ width }) => <p>picture of {width}</p>}
      </Figure>,
    );
    await settled();
    expect(screen.getByRole('figure', { name: 'z against time' })).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Table' }));
    expect(screen.queryByText(/picture/)).toBeNull();
    expect(screen.getByRole('region', { name: 'z against time, table' })).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: '2' }));
    expect(onSelect).toHaveBeenCalledWith(1);
    fireEvent.click(screen.getByRole('button', { name: 'Picture' }));
    expect(screen.getByText('picture of 320')).toBeTruthy();
  });
});
