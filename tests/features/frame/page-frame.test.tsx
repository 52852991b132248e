import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { PageFrame } from '@/features/frame/page-frame';
import { type FakeAnswer, fakeArchive, renderScreen } from '../../support/fake-archive';
import type { Session } from '@/schemas/generated/contract';
import { windowWidth } from '../../support/window-width';

const mockPush = jest.fn();
const mockReplace = jest.fn();
let mockPath = '/';
jest.mock('expo-router', () => ({
  usePathname: () => mockPath,
  router: { push: (...to: unknown[]) => mockPush(...to), replace: (...to: unknown[]) => mockReplace(...to) },
}));

const session = (user: Session['user'], waiting = 0): FakeAnswer => ({
  body: { user, waiting, digest: user ? true : null, development: false },
});
const curator: Session['user'] = {
  id: '00000000-0000-4000-8000-000000000001',
  name: 'Paul Weidner',
  email: 'paul@example.org',
  orcid: null,
  role: 'curator',
  confirmed: true,
  createdAt: '2026-03-02T10:00:00.000Z',
};

const show = () =>
  renderScreen(
    <PageFrame>
      <p>content</p>
    </PageFrame>,
  );
const press = (key: string) => fireEvent.keyDown(document.body, { key });

beforeEach(() => {
  windowWidth(1440);
  // The document of the tests has no pointer and cannot scroll.
  window.matchMedia = (media) => ({ matches: false, media }) as MediaQueryList;
  window.scrollTo = () => undefined;
  mockPath = '/';
  mockPush.mockClear();
  mockReplace.mockClear();
});

describe('the frame of a page', () => {
  it('leads to the content first, then to the four places, and marks the one that is shown', async () => {
    mockPath = '/systems/lorenz';
    fakeArchive({ 'GET /session': session(null) });
    show();
    await screen.findByRole('link', { name: 'Sign in' });
    const links = screen.getAllByRole('link').map((link) => link.textContent);
    expect(links).toEqual(['To the content', 'Ritornel', 'Catalogue', 'Systems', 'Bench', 'Desk', 'Sign in']);
    expect(screen.getByRole('link', { name: 'Systems' }).getAttribute('aria-current')).toBe('page');
  });

  it('comes back to the page after signing in', async () => {
    mockPath = '/orbits/RTN-0000001X';
    fakeArchive({ 'GET /session': session(null) });
    show();
    const link = await screen.findByRole('link', { name: 'Sign in' });
    expect(link.getAttribute('href')).toBe('/sign-in?next=%2Forbits%2FRTN-0000001X');
  });

  it('says how much waits on the Desk for this person', async () => {
    fakeArchive({ 'GET /session': session(curator, 2) });
    show();
    expect(await screen.findByRole('link', { name: 'Desk, 2 wait for you' })).toBeTruthy();
  });

  it('signs out and leads home', async () => {
    const calls = fakeArchive({
      'GET /session': session(curator),
      'DELETE /session': { status: 204, body: undefined },
    });
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Account of Paul Weidner' }));
    const menu = screen.getByRole('dialog', { name: 'Paul Weidner' });
    expect(within(menu).queryByRole('link', { name: /Administration/ })).toBeNull();
    fireEvent.click(within(menu).getByRole('button', { name: 'Sign out' }));
    await waitFor(() => expect(mockReplace).toHaveBeenCalledWith('/'));
    expect(calls.some(({ method }) => method === 'DELETE')).toBe(true);
  });

  it('shows administration to administrators', async () => {
    fakeArchive({ 'GET /session': session({ ...curator, role: 'administrator' }) });
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Account of Paul Weidner' }));
    expect(screen.getByRole('link', { name: /Administration/ }).getAttribute('href')).toBe('/administration/users');
  });

  it('goes to a place by g and its letter, but not while somebody types', async () => {
    fakeArchive({ 'GET /session': session(null) });
    renderScreen(
      <PageFrame>
        <input aria-label="field" />
      </PageFrame>,
    );
    await screen.findByRole('link', { name: 'Sign in' });
    fireEvent.keyDown(screen.getByLabelText('field'), { key: 'g' });
    fireEvent.keyDown(screen.getByLabelText('field'), { key: 's' });
    expect(mockPush).not.toHaveBeenCalled();
    press('g');
    press('s');
    expect(mockPush).toHaveBeenCalledWith('/systems');
  });

  it('lists the keys under ?', async () => {
    fakeArchive({ 'GET /session': session(null) });
    show();
    await screen.findByRole('link', { name: 'Sign in' });
    press('?');
    expect(screen.getByRole('dialog', { name: 'Keys' })).toBeTruthy();
    act(() => void fireEvent.keyDown(document.activeElement ?? document.body, { key: 'Escape' }));
    expect(screen.queryByRole('dialog', { name: 'Keys' })).toBeNull();
  });
});

describe('the frame on a phone', () => {
  it('puts the places below and the way back from a system above', async () => {
    windowWidth(390);
    mockPath = '/systems/lorenz';
    fakeArchive({ 'GET /session': session(curator) });
    show();
    expect(await screen.findByRole('button', { name: 'Account of Paul Weidner' })).toBeTruthy();
    expect(screen.getByText('PW')).toBeTruthy();
    expect(screen.getByRole('link', { name: '← Systems' }).getAttribute('href')).toBe('/systems');
    expect(screen.getAllByRole('navigation', { name: 'Places' })).toHaveLength(1);
  });

  it('lets a curator turn the daily mail off', async () => {
    const calls = fakeArchive({
      'GET /session': session(curator),
      'PATCH /session': { body: { user: curator, waiting: 0, digest: false, development: false } },
    });
    show();
    fireEvent.click(await screen.findByRole('button', { name: /Paul Weidner/ }));
    const box = await screen.findByRole<HTMLInputElement>('checkbox', { name: /A daily mail/ });
    expect(box.checked).toBe(true);
    fireEvent.click(box);
    await waitFor(() => expect(box.checked).toBe(false));
    expect(calls.find(({ method }) => method === 'PATCH')?.body).toEqual({ digest: false });
  });
});
