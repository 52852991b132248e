import { act, fireEvent, render, screen } from '@testing-library/react';
import { Empty, Failure, Masthead, Page, PageSkeleton, PlacesBar, Text, useThemeChoice } from '@/features/ui';
import { windowWidth } from '../../support/window-width';

describe('Failure', () => {
  it('takes the focus on its heading, says what is safe, and offers to try again', () => {
    const onRetry = jest.fn();
    const error = { message: 'The archive took longer than 10 s.', requestId: '7f3c-19a2' };
    render(<Failure error={error} title="The search did not answer" kept="Your search is kept." onRetry={onRetry} />);
    const heading = screen.getByRole('heading', { name: 'The search did not answer' });
    expect(document.activeElement).toBe(heading);
    expect(screen.getByText('The archive took longer than 10 s. Your search is kept.')).toBeTruthy();
    expect(screen.getByText('7f3c-19a2')).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(onRetry).toHaveBeenCalledTimes(1);
  });

  it('says that nothing was lost whatever was thrown', () => {
    render(<Failure error="torn" />);
    expect(screen.getByText('Nothing was lost.')).toBeTruthy();
  });
});

describe('PageSkeleton', () => {
  it('is silent at first and says what is waited for after four seconds', () => {
    jest.useFakeTimers();
    render(<PageSkeleton title="Systems" waitingFor="Waiting for the systems…" />);
    expect(screen.queryByText('Waiting for the systems…')).toBeNull();
    act(() => jest.advanceTimersByTime(4000));
    expect(screen.getByText('Waiting for the systems…')).toBeTruthy();
    jest.useRealTimers();
  });
});

describe('Page', () => {
  it('has one first-level heading, names the document, and links back', () => {
    render(
      <Page title="Lorenz" back={{ href: '/systems', label: 'Systems' }}>
        <Empty>No orbit yet.</Empty>
      </Page>,
    );
    expect(screen.getByRole('heading', { level: 1, name: 'Lorenz' }).tagName).toBe('H1');
    expect(document.title).toBe('Lorenz · Ritornel');
    expect(screen.getByRole('link', { name: '← Systems' }).getAttribute('href')).toBe('/systems');
  });
});

describe('places', () => {
  const places = [
    { href: '/', label: 'Catalogue', active: true },
    { href: '/desk', label: 'Desk', active: false, waiting: 2 },
  ];

  it('name what waits and which one is shown', () => {
    render(<PlacesBar places={places} />);
    expect(screen.getByRole('link', { name: 'Desk, 2 wait for you' })).toBeTruthy();
    expect(screen.getByRole('link', { current: 'page' }).textContent).toBe('Catalogue');
  });

  it('stand in the masthead on a wide screen', () => {
    windowWidth(1280);
    render(<Masthead places={places} account={<Text>Demo curator</Text>} />);
    expect(screen.getByRole('banner').querySelectorAll('nav a')).toHaveLength(2);
  });
});

function ThemeProbe() {
  const [choice, choose] = useThemeChoice();
  return <button onClick={() => choose(choice === 'plate' ? 'device' : 'plate')}>{choice}</button>;
}

describe('the theme', () => {
  it('is kept on the device and given up again', () => {
    render(<ThemeProbe />);
    fireEvent.click(screen.getByRole('button', { name: 'device' }));
    expect(document.documentElement.dataset['theme']).toBe('plate');
    expect(window.localStorage.getItem('ritornel.theme')).toBe('plate');
    fireEvent.click(screen.getByRole('button', { name: 'plate' }));
    expect(document.documentElement.dataset['theme']).toBeUndefined();
    expect(window.localStorage.getItem('ritornel.theme')).toBeNull();
  });
});
