import { act, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { CopyButton, LiveRegion } from '@/features/ui';

const written: string[] = [];

beforeEach(() => {
  written.length = 0;
  Object.assign(navigator, {
    clipboard: {
      writeText: (text: string) => {
        written.push(text);
        return Promise.resolve();
      },
    },
  });
});

const PERIOD = '6.68394083320531006528563792235913412345678';

describe('CopyButton', () => {
  it('copies every digit, says how many, and reads Copied for two seconds', async () => {
    jest.useFakeTimers();
    render(
      <>
        <CopyButton text={PERIOD} what="period" />
        <LiveRegion />
      </>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Copy period' }));
    await act(() => jest.advanceTimersByTimeAsync(0));
    expect(written).toEqual([PERIOD]);
    expect(screen.getByRole('status').textContent).toBe('Copied, 42 digits');
    expect(screen.getByRole('button').textContent).toBe('Copied');
    act(() => jest.advanceTimersByTime(2000));
    expect(screen.getByRole('button').textContent).toBe('Copy');
    jest.useRealTimers();
  });

  it('says so when the browser refuses', async () => {
    Object.assign(navigator, { clipboard: { writeText: () => Promise.reject(new Error('denied')) } });
    render(
      <>
        <CopyButton text="z - 27" />
        <LiveRegion />
      </>,
    );
    fireEvent.click(screen.getByRole('button', { name: 'Copy' }));
    await waitFor(() => expect(screen.getByRole('button').textContent).toBe('Not copied'));
    expect(screen.getByRole('status').textContent).toContain('Select the text and copy it.');
  });
});
