import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { useState } from 'react';
import { CatalogueScreen } from '@/features/catalogue/catalogue-screen';
import { type FakeAnswer, fakeArchive, problem, renderScreen } from '../../support/fake-archive';
import { entryAAB, entryAB, lorenzSystem, pageOf, rosslerSystem } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const systems: FakeAnswer = { body: { items: [lorenzSystem, rosslerSystem] } };
const both: FakeAnswer = { body: pageOf(entryAB, entryAAB) };

const onOpen = jest.fn();

/** The screen with an address that follows it, as the route gives it one. */
function Addressed({ start }: { start: { text: string; sort: string } }) {
  const [search, setSearch] = useState(start);
  return (
    <CatalogueScreen
      {...search}
      onSearch={(change) =>
        setSearch((before) => ({
          text: 'q' in change ? (change.q ?? '') : before.text,
          sort: 'sort' in change ? (change.sort ?? '') : before.sort,
        }))
      }
      onOpen={onOpen}
    />
  );
}

const show = (text: string, sort = '') => renderScreen(<Addressed start={{ text, sort }} />);

beforeEach(() => {
  windowWidth(1440);
  // The document of the tests has no layout to scroll in.
  Element.prototype.scrollIntoView = jest.fn();
  onOpen.mockClear();
});

describe('the catalogue', () => {
  it('draws empty staves while the search is on its way', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': 'never' });
    show('lorenz');
    expect(await screen.findByText('Loading')).toBeTruthy();
  });

  it('shows what was understood, the count, how complete the catalogue is, and the results', async () => {
    const calls = fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz 1.5587');
    expect(await screen.findByRole('link', { name: /RTN-0000001X/ })).toBeTruthy();
    const understood = screen.getByRole('group', { name: 'Understood as' });
    expect(within(understood).getByRole('button', { name: 'Remove system Lorenz' })).toBeTruthy();
    expect(within(understood).getByRole('button', { name: 'Remove period 1.5587, rounded' })).toBeTruthy();
    expect(screen.getByRole('heading', { name: '2 orbits' })).toBeTruthy();
    expect(screen.getByText(/up to 3 returns: 3 of 3 orbits that its itineraries allow/)).toBeTruthy();
    const search = calls.find(({ path, query }) => path === '/orbits' && query.has('include'));
    expect(Object.fromEntries(search?.query ?? [])).toMatchObject({
      system: 'lorenz',
      period: '1.5587',
      include: 'incipit',
    });
  });

  it('carries the search along to an entry', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz', '-period');
    const link = await screen.findByRole('link', { name: /RTN-0000001X/ });
    expect(link.getAttribute('href')).toBe('/orbits/RTN-0000001X?q=lorenz&sort=-period');
  });

  it('offers exactly this result as a file', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz 2 to 3 returns saddle');
    const csv = await screen.findByRole('link', { name: 'Export as CSV' });
    expect(csv.getAttribute('href')).toBe('/api/v1/orbits.csv?system=lorenz&returns=2..3&stability=saddle');
  });

  it('takes a filter out with its chip', async () => {
    const calls = fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz 2 returns');
    fireEvent.click(await screen.findByRole('button', { name: 'Remove returns 2' }));
    expect(screen.getByRole<HTMLInputElement>('searchbox', { name: 'Search the catalogue' }).value).toBe('lorenz');
    await waitFor(() => expect(calls.at(-1)?.query.get('returns')).toBeNull());
  });

  it('writes a filter into the search line and asks for it', async () => {
    const calls = fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz');
    await screen.findByRole('link', { name: /RTN-0000001X/ });
    fireEvent.change(screen.getByLabelText('Shortest period'), { target: { value: '2' } });
    fireEvent.click(screen.getByLabelText('saddle'));
    const line = screen.getByRole<HTMLInputElement>('searchbox', { name: 'Search the catalogue' });
    expect(line.value).toBe('lorenz period from 2 saddle');
    await waitFor(() => {
      expect(calls.at(-1)?.query.get('periodMin')).toBe('2');
      expect(calls.at(-1)?.query.get('stability')).toBe('saddle');
    });
  });

  it('keeps an unfinished filter in its field and says what it needs', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz');
    const field = await screen.findByLabelText<HTMLInputElement>('Shortest period');
    fireEvent.change(field, { target: { value: '2,5' } });
    expect(field.value).toBe('2,5');
    expect(screen.getByText('Needs a positive number.')).toBeTruthy();
    expect(screen.getByRole<HTMLInputElement>('searchbox', { name: 'Search the catalogue' }).value).toBe('lorenz');
  });

  it('names the nearest periods when nothing is found, and widens to them', async () => {
    const calls = fakeArchive({
      'GET /systems': systems,
      'GET /orbits': ({ query }) => {
        if (query.get('sort') === '-period') return { body: pageOf(entryAB) };
        if (query.get('sort') === 'period') return { body: pageOf(entryAAB) };
        return { body: pageOf() };
      },
    });
    show('lorenz 2.0 to 2.1');
    expect(await screen.findByText(/has a period between 2.0 and 2.1/)).toBeTruthy();
    expect(await screen.findByText(/The nearest are 1.559 and 2.306/)).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'Widen to 1.5 to 2.4' }));
    await waitFor(() => expect(calls.some(({ query }) => query.get('periodMax') === '2.4')).toBe(true));
  });

  it('says that the search did not answer, keeps it, and tries again', async () => {
    let answer: FakeAnswer = problem(503, 'search-too-slow', 'This search takes too long.');
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': () => answer });
    show('lorenz');
    expect(await screen.findByRole('heading', { name: 'The search did not answer' })).toBeTruthy();
    expect(screen.getByText(/Your search is kept in the address; nothing was lost/)).toBeTruthy();
    expect(screen.getByText('7f3c-19a2')).toBeTruthy();
    answer = both;
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('link', { name: /RTN-0000001X/ })).toBeTruthy();
  });

  it('tells being offline from an error of the server', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': 'offline' });
    show('lorenz');
    expect(await screen.findByRole('heading', { name: 'No connection' })).toBeTruthy();
  });

  it('says the result to a screen reader once it rests', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz');
    await screen.findByRole('link', { name: /RTN-0000001X/ });
    await waitFor(() => expect(screen.getByText(/2 orbits, sorted by period, rising/)).toBeTruthy());
  });

  it('walks the results by j and k, opens by Enter, and finds the search line by /', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz');
    await screen.findByRole('link', { name: /RTN-0000001X/ });
    fireEvent.keyDown(document.body, { key: 'j' });
    fireEvent.keyDown(document.body, { key: 'j' });
    fireEvent.keyDown(document.body, { key: 'Enter' });
    expect(onOpen).toHaveBeenCalledWith('/orbits/RTN-00000028?q=lorenz');
    fireEvent.keyDown(document.body, { key: '/' });
    expect(document.activeElement).toBe(screen.getByRole('searchbox', { name: 'Search the catalogue' }));
  });

  it('opens an accession that was typed', async () => {
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both, 'GET /orbits/RTN-0000001X': { body: entryAB } });
    show('RTN-0000001X');
    await screen.findByRole('link', { name: /RTN-0000001X/ });
    fireEvent.keyDown(screen.getByRole('searchbox', { name: 'Search the catalogue' }), { key: 'Enter' });
    expect(onOpen).toHaveBeenCalledWith('/orbits/RTN-0000001X');
  });

  it('offers the right accession when a check character does not fit', async () => {
    const detail = 'The check character of RTN-00000011 does not fit its digits. With these digits it is RTN-0000001X.';
    fakeArchive({
      'GET /systems': systems,
      'GET /orbits/RTN-00000011': problem(404, 'wrong-check-character', detail),
    });
    show('RTN-00000011');
    expect((await screen.findByRole('link', { name: 'RTN-0000001X' })).getAttribute('href')).toBe(
      '/orbits/RTN-0000001X',
    );
  });
});

describe('the catalogue on a phone', () => {
  it('applies the filters of the sheet only on Show, whose number follows', async () => {
    windowWidth(390);
    fakeArchive({ 'GET /systems': systems, 'GET /orbits': both });
    show('lorenz');
    await screen.findByRole('link', { name: /RTN-0000001X/ });
    fireEvent.click(screen.getByRole('button', { name: 'Filters 1' }));
    const sheet = screen.getByRole('dialog', { name: 'Filters' });
    fireEvent.change(within(sheet).getByLabelText('Fewest returns'), { target: { value: '2' } });
    const line = screen.getByLabelText<HTMLInputElement>('Search the catalogue');
    expect(line.value).toBe('lorenz');
    fireEvent.click(await within(sheet).findByRole('button', { name: 'Show 2 orbits' }));
    expect(line.value).toBe('lorenz 2 returns');
    await act(async () => Promise.resolve());
  });
});
