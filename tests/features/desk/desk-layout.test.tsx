import { act, fireEvent, screen, within } from '@testing-library/react';
import { DeskLayout } from '@/features/desk/desk-layout';
import { curator, sessionOf, submissionAB, submissionPage } from '../../support/desk-fixtures';
import { fakeArchive, renderScreen } from '../../support/fake-archive';
import { lorenzSystem } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const mockPush = jest.fn();
let mockPath = '/desk';
jest.mock('expo-router', () => ({
  usePathname: () => mockPath,
  router: { push: (...to: unknown[]) => mockPush(...to) },
}));

const waits = [
  submissionAB,
  { ...submissionAB, id: 's2', number: 42 },
  { ...submissionAB, id: 's3', number: 43, isMine: true },
  { ...submissionAB, id: 's4', number: 44, checkState: 'running', turn: 'machine', report: null, verdict: null },
] as const;
const returned = { ...submissionAB, id: 's5', number: 45, reviewState: 'returned', turn: 'contributor' } as const;

function show(path: string) {
  mockPath = path;
  fakeArchive({
    'GET /session': { body: sessionOf(curator) },
    'GET /submissions': ({ query }) => ({
      body: query.get('queue') === 'returned' ? submissionPage(returned) : submissionPage(...waits),
    }),
    'GET /systems/lorenz': { body: lorenzSystem },
  });
  return renderScreen(
    <DeskLayout>
      <p>what is open</p>
    </DeskLayout>,
  );
}

beforeEach(() => mockPush.mockClear());

describe('the Desk of a curator with room', () => {
  beforeEach(() => windowWidth(1440));

  it('keeps the queue beside what is open, by whose turn it is', async () => {
    show('/desk/s2');
    const queue = await screen.findByRole('region', { name: 'Queue' });
    const numbers = async (turn: string) =>
      within(await within(queue).findByRole('list', { name: turn }))
        .getAllByRole('link')
        .map((link) => link.getAttribute('href'));
    expect(await numbers('Your turn')).toEqual(['/desk/s1', '/desk/s2']);
    expect(await numbers('Another curator’s turn')).toEqual(['/desk/s3']);
    expect(await numbers('Contributor’s turn')).toEqual(['/desk/s5']);
    expect(await numbers('Machine’s turn')).toEqual(['/desk/s4']);
    expect(within(queue).getByRole('link', { current: 'page' }).getAttribute('href')).toBe('/desk/s2');
  });

  it('goes on to the next and the previous one by j and k, and stops at the ends', async () => {
    show('/desk/s2');
    await screen.findByRole('list', { name: 'Machine’s turn' });
    fireEvent.keyDown(window, { key: 'j' });
    fireEvent.keyDown(window, { key: 'k' });
    expect(mockPush.mock.calls).toEqual([['/desk/s3'], ['/desk/s1']]);
  });

  it('walks the queue by j and k where none is open', async () => {
    show('/desk');
    await screen.findByRole('list', { name: 'Machine’s turn' });
    const focused = () => document.activeElement?.getAttribute('href');
    act(() => void fireEvent.keyDown(window, { key: 'j' }));
    expect(focused()).toBe('/desk/s1');
    act(() => void fireEvent.keyDown(window, { key: 'j' }));
    expect(focused()).toBe('/desk/s2');
    act(() => void fireEvent.keyDown(window, { key: 'k' }));
    expect(focused()).toBe('/desk/s1');
    expect(mockPush).not.toHaveBeenCalled();
  });
});

it('leaves a narrow window to what is open', async () => {
  windowWidth(1100);
  show('/desk/s2');
  expect(await screen.findByText('what is open')).toBeTruthy();
  expect(screen.queryByRole('region', { name: 'Queue' })).toBeNull();
});
