import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { ReleasesScreen } from '@/features/releases/releases-screen';
import type { Release } from '@/schemas/generated/contract';
import { fakeArchive, problem, renderScreen } from '../../support/fake-archive';
import { windowWidth } from '../../support/window-width';

const HASH = 'c0ffee'.padEnd(64, '0');

const release = (change: Partial<Release> = {}): Release => ({
  id: 2,
  state: 'ready',
  note: 'With the orbits of nine returns.',
  cutBy: 'Ana Ilić',
  askedAt: '2026-05-04T08:00:00.000Z',
  cutAt: '2026-05-04T08:01:00.000Z',
  previous: 1,
  entries: 1077,
  changes: { added: 60, revised: 4, withdrawn: 1 },
  files: [
    {
      name: 'orbits.ndjson.gz',
      mediaType: 'application/x-ndjson',
      bytes: 3_412_007,
      sha256: HASH,
      href: '/api/v1/releases/2/files/orbits.ndjson.gz',
    },
  ],
  citation: 'Ritornel: release 2 of 4 May 2026.',
  licence: 'CC-BY-4.0',
  caution: 'A numerical result of an idealised model.',
  failure: null,
  links: { self: '/api/v1/releases/2', page: '/releases/2' },
  ...change,
});

const session = (role: string | null) => ({
  body: {
    user: role && { id: 'u', name: 'Ana Ilić', email: 'a@orbits.example', role, orcid: null, confirmed: true },
  },
});

beforeEach(() => windowWidth(1440));

describe('the page of releases', () => {
  it('says of each when it was cut, what changed, and gives its files with their hashes', async () => {
    fakeArchive({ 'GET /releases': { body: { items: [release()] } }, 'GET /session': session(null) });
    renderScreen(<ReleasesScreen />);
    expect(await screen.findByText(/^1,077 entries, cut on 4 May 2026 by Ana Ilić\./)).toBeTruthy();
    expect(screen.getByText(/Since release 1: 60 added, 4 revised, 1 withdrawn\./)).toBeTruthy();
    const row = screen.getByRole('row', { name: /orbits\.ndjson\.gz/ });
    expect(within(row).getByText('3.4 MB')).toBeTruthy();
    expect(within(row).getByText(HASH)).toBeTruthy();
    expect(within(row).getByRole('link').getAttribute('href')).toBe('/api/v1/releases/2/files/orbits.ndjson.gz');
    expect(screen.queryByRole('button', { name: 'Cut a release' })).toBeNull();
  });

  it('is empty before the first, and says so', async () => {
    fakeArchive({ 'GET /releases': { body: { items: [] } }, 'GET /session': session(null) });
    renderScreen(<ReleasesScreen />);
    expect(await screen.findByText('No release has been cut yet.')).toBeTruthy();
  });

  it('says when the list does not come, and asks again', async () => {
    let answer = problem(503, 'not-ready', 'The server is not ready.');
    fakeArchive({ 'GET /releases': () => answer, 'GET /session': session(null) });
    renderScreen(<ReleasesScreen />);
    await screen.findByRole('heading', { name: 'The list of releases did not answer' });
    answer = { body: { items: [release()] } };
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText(/^1,077 entries/)).toBeTruthy();
  });

  it('lets a curator cut one, with a note', async () => {
    const items: Release[] = [];
    const calls = fakeArchive({
      'GET /session': session('curator'),
      'GET /releases': () => ({ body: { items: [...items] } }),
      'POST /releases': () => {
        const cutting = release({
          state: 'cutting',
          cutAt: null,
          entries: null,
          changes: null,
          files: [],
          citation: null,
        });
        items.push(cutting);
        return { status: 202, body: cutting };
      },
    });
    renderScreen(<ReleasesScreen />);
    fireEvent.change(await screen.findByLabelText('Note, kept with the release'), { target: { value: 'The first.' } });
    fireEvent.click(screen.getByRole('button', { name: 'Cut a release' }));
    expect(await screen.findByText(/^Being cut since 4 May 2026/)).toBeTruthy();
    const sent = calls.find(({ method }) => method === 'POST')!;
    expect(sent.body).toEqual({ note: 'The first.' });
    expect(sent.headers['Idempotency-Key']).toMatch(/^[0-9a-f]{32}$/);
    const button = screen.getByRole('button', { name: 'Cut a release' });
    expect(button.getAttribute('aria-disabled')).toBe('true');
  });

  it('keeps the note when the release is refused', async () => {
    fakeArchive({
      'GET /session': session('curator'),
      'GET /releases': { body: { items: [] } },
      'POST /releases': problem(409, 'release-in-work', 'A release is being cut already.'),
    });
    renderScreen(<ReleasesScreen />);
    const note = await screen.findByLabelText<HTMLTextAreaElement>('Note, kept with the release');
    fireEvent.change(note, { target: { value: 'Kept.' } });
    fireEvent.click(screen.getByRole('button', { name: 'Cut a release' }));
    expect(await screen.findByText('A release is being cut already.')).toBeTruthy();
    await waitFor(() => expect(note.value).toBe('Kept.'));
  });

  it('shows one release alone, and says when there is none of its number', async () => {
    fakeArchive({ 'GET /releases': { body: { items: [release()] } }, 'GET /session': session('curator') });
    renderScreen(<ReleasesScreen only="2" />);
    expect(await screen.findByRole('heading', { name: 'Release 2' })).toBeTruthy();
    expect(await screen.findByText(/idealised model/)).toBeTruthy();
    expect(screen.queryByRole('button', { name: 'Cut a release' })).toBeNull();
  });

  it('says that a number has no release', async () => {
    fakeArchive({ 'GET /releases': { body: { items: [release()] } }, 'GET /session': session(null) });
    renderScreen(<ReleasesScreen only="7" />);
    expect(await screen.findByText('There is no release 7.')).toBeTruthy();
  });

  it('says why one could not be cut', async () => {
    const failed = release({
      state: 'failed',
      cutAt: null,
      changes: null,
      files: [],
      citation: null,
      failure: 'The disk is full.',
    });
    fakeArchive({ 'GET /releases': { body: { items: [failed] } }, 'GET /session': session(null) });
    renderScreen(<ReleasesScreen />);
    expect(await screen.findByText('It could not be cut: The disk is full.')).toBeTruthy();
  });
});
