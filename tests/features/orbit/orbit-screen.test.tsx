import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { OrbitScreen } from '@/features/orbit/orbit-screen';
import type { Entry, EntryRevision } from '@/schemas/generated/contract';
import { type FakeAnswer, fakeArchive, problem, renderScreen } from '../../support/fake-archive';
import { entryAAB, entryAB, lorenzSystem, pageOf, traceAB } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const revisionOf = (revision: number): EntryRevision => ({
  revision,
  at: '2026-03-16T10:00:00.000Z',
  by: revision === 1 ? 'Paul Weidner' : null,
  why: revision === 1 ? 'Accepted.' : 'Refined to 30 digits by the archive.',
  evidence: revision === 1 ? { level: 're-integrated', digits: 15 } : { level: 'refined', digits: 30 },
  links: { self: `/api/v1/orbits/RTN-0000001X?revision=${revision}` },
});

const answers = (entry: Entry = entryAB): Record<string, FakeAnswer> => ({
  [`GET /orbits/${entry.accession}`]: { body: entry },
  [`GET /orbits/${entry.accession}/trace`]: { body: traceAB },
  [`GET /orbits/${entry.accession}/revisions`]: {
    body: { items: [revisionOf(1)] },
  },
  'GET /systems/lorenz': { body: lorenzSystem },
  'GET /orbits': { body: pageOf(entryAB, entryAAB) },
});

const show = (accession = entryAB.accession, trail: Parameters<typeof OrbitScreen>[0]['trail'] = null) =>
  renderScreen(<OrbitScreen accession={accession} trail={trail} />);

beforeEach(() => windowWidth(1440));

describe('the page of an entry', () => {
  it('draws empty staves under its accession while it is on its way', async () => {
    fakeArchive({ [`GET /orbits/${entryAB.accession}`]: 'never' });
    show();
    expect(await screen.findByRole('heading', { name: 'RTN-0000001X' })).toBeTruthy();
    expect(screen.getByText('Loading')).toBeTruthy();
  });

  it('shows the numbers in full, and what is copied is what is stored', async () => {
    const writeText = jest.fn().mockResolvedValue(undefined);
    Object.assign(navigator, { clipboard: { writeText } });
    fakeArchive(answers());
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Copy period' }));
    expect(await screen.findByText('Copied, 17 digits')).toBeTruthy();
    expect(writeText).toHaveBeenCalledWith('1.5586522107161747');
    fireEvent.click(screen.getByRole('button', { name: 'Copy point' }));
    await waitFor(() => expect(writeText).toHaveBeenCalledTimes(2));
    await screen.findAllByText('Copied');
    expect(writeText).toHaveBeenLastCalledWith('-13.763610682134201, -19.578751942451796, 27');
    expect(screen.getByText('fixed by the section')).toBeTruthy();
    expect(screen.getByRole('table', { name: 'Return times and crossings' })).toBeTruthy();
  });

  it('says how it is known, who gave it, and closes with the caution', async () => {
    fakeArchive(answers());
    show();
    expect(await screen.findByText(/15 digits confirmed/)).toBeTruthy();
    expect(screen.getByText(/Ida Marten/)).toBeTruthy();
    expect(screen.getByText(/14 March 2026/)).toBeTruthy();
    expect(screen.getByText(/Nothing here is cleared for the operation/)).toBeTruthy();
  });

  it('reads the incipit out and draws the figures with their tables', async () => {
    fakeArchive(answers());
    show();
    expect(await screen.findByRole('slider', { name: /^two crossings, x = −13.8, 13.8; accepted/ })).toBeTruthy();
    for (const name of [/Projection on x, z/, /On the section z = 27/, /z against time/, 'Multipliers']) {
      const figure = await screen.findByRole('figure', { name });
      expect(within(figure).getByRole('button', { name: 'Table' })).toBeTruthy();
    }
  });

  it('leads to its neighbours in period, and to the system', async () => {
    fakeArchive(answers());
    show();
    const near = await screen.findAllByRole('link', { name: 'RTN-00000028' });
    expect(near[0]?.getAttribute('href')).toBe('/orbits/RTN-00000028');
    expect(screen.getByText(/\+0.747255/)).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Lorenz' }).getAttribute('href')).toBe('/systems/lorenz');
  });

  it('leads back to the search that found it', async () => {
    fakeArchive(answers());
    show(entryAB.accession, {
      href: '/?q=lorenz',
      label: '2 orbits',
      detail: 'Lorenz',
      previous: null,
      next: '/orbits/RTN-00000028?q=lorenz',
    });
    expect((await screen.findByRole('link', { name: '← 2 orbits: Lorenz' })).getAttribute('href')).toBe('/?q=lorenz');
    expect(screen.getByRole('link', { name: /^next/ }).getAttribute('href')).toBe('/orbits/RTN-00000028?q=lorenz');
    expect(screen.queryByRole('link', { name: /^previous/ })).toBeNull();
  });

  it('cites with the sentence and the BibTeX of the server, and the permanent address', async () => {
    const calls = fakeArchive({
      ...answers(),
      'GET /orbits/RTN-0000001X.txt': { body: 'Jana Nováková: Periodic orbit RTN-0000001X, revision 1.\n' },
      'GET /orbits/RTN-0000001X.bib': { body: '@misc{RTN-0000001X,\n}\n' },
    });
    show();
    const cite = await screen.findByRole('button', { name: 'Cite' });
    expect(calls.some(({ path }) => path.endsWith('.bib'))).toBe(false);
    fireEvent.click(cite);
    const sheet = screen.getByRole('dialog', { name: 'Cite' });
    expect(await within(sheet).findByText('Jana Nováková: Periodic orbit RTN-0000001X, revision 1.')).toBeTruthy();
    expect(within(sheet).getByText(/^@misc\{RTN-0000001X,/)).toBeTruthy();
    expect(within(sheet).getByText(/^http:\/\/localhost\/orbits\/RTN-0000001X$/)).toBeTruthy();
  });

  it('says when the citation does not come, and asks again', async () => {
    let answer: FakeAnswer = 'offline';
    fakeArchive({
      ...answers(),
      'GET /orbits/RTN-0000001X.txt': () => answer,
      'GET /orbits/RTN-0000001X.bib': () => answer,
    });
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Cite' }));
    const sheet = screen.getByRole('dialog', { name: 'Cite' });
    expect(await within(sheet).findByText(/permanent address below/)).toBeTruthy();
    answer = { body: 'A sentence.' };
    fireEvent.click(within(sheet).getByRole('button', { name: 'Try again' }));
    expect(await within(sheet).findAllByText('A sentence.')).toHaveLength(2);
  });

  it('offers JSON, CSV, BibTeX, CSL-JSON and RIS', async () => {
    fakeArchive(answers());
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Export' }));
    const csv = screen.getByRole('menuitem', { name: 'CSV' });
    expect(csv.getAttribute('href')).toBe('/api/v1/orbits/RTN-0000001X.csv');
    const csl = screen.getByRole('menuitem', { name: 'CSL-JSON' });
    expect(csl.getAttribute('download')).toBe('RTN-0000001X.csl.json');
  });

  it('keeps the numbers of a withdrawn entry and names what replaces it', async () => {
    const withdrawal = { at: '2026-04-03T08:00:00.000Z', reason: 'A repeat.', replacement: 'RTN-00000028' };
    fakeArchive(answers({ ...entryAB, status: 'withdrawn', withdrawal }));
    show();
    expect(await screen.findByText('withdrawn, 3 April 2026')).toBeTruthy();
    expect(screen.getByText(/A repeat\./)).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Copy period' })).toBeTruthy();
  });

  it('keeps the numbers when the curve does not come, and draws it when asked again', async () => {
    let trace = problem(503, 'not-ready', 'The server is not ready.');
    const calls = fakeArchive({ ...answers(), [`GET /orbits/${entryAB.accession}/trace`]: () => trace });
    show();
    const again = await screen.findByRole('button', { name: 'Draw the curve again' });
    expect(screen.getByRole('button', { name: 'Copy period' })).toBeTruthy();
    trace = { body: traceAB };
    fireEvent.click(again);
    expect(await screen.findByRole('figure', { name: /Projection/ })).toBeTruthy();
    expect(calls.filter(({ path }) => path.endsWith('/trace'))).toHaveLength(2);
  });

  it('says which accession is meant when the check character does not fit', async () => {
    const detail = 'The check character of RTN-00000011 does not fit its digits. With these digits it is RTN-0000001X.';
    fakeArchive({ 'GET /orbits/RTN-00000011': problem(404, 'wrong-check-character', detail) });
    show('RTN-00000011');
    expect(await screen.findByRole('heading', { name: 'Nothing here' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'RTN-0000001X' })).toBeTruthy();
  });

  it('says that the archive did not answer, and tries again', async () => {
    let answer: FakeAnswer = problem(500, 'internal-error', 'Something broke on our side.');
    fakeArchive({ ...answers(), [`GET /orbits/${entryAB.accession}`]: () => answer });
    show();
    expect(await screen.findByRole('heading', { name: 'The entry did not answer' })).toBeTruthy();
    answer = { body: entryAB };
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('button', { name: 'Copy period' })).toBeTruthy();
  });
});

describe('the page of an entry on a phone', () => {
  it('has its actions in a strip and the closure as a field', async () => {
    windowWidth(390);
    fakeArchive(answers());
    show();
    const strip = await screen.findByRole('group', { name: 'Actions on the entry' });
    expect(within(strip).getByRole('button', { name: 'Copy all' })).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Copy closure' })).toBeTruthy();
  });

  it('names the entry that is its image, and has the line to cite', async () => {
    fakeArchive({
      ...answers(),
      'GET /orbits/RTN-0000001X/images': { body: { items: [{ accession: 'RTN-00000256', symmetry: 'half-turn' }] } },
      'GET /orbits/RTN-0000001X.txt': { body: 'Ida Marten: Periodic orbit RTN-0000001X.\n' },
    });
    show();
    expect((await screen.findByRole('link', { name: 'RTN-00000256' })).parentElement?.textContent).toBe(
      'Its image under the half-turn: RTN-00000256',
    );
    expect(await screen.findByText('Ida Marten: Periodic orbit RTN-0000001X.')).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Copy citation' })).toBeTruthy();
  });
});
