import { fireEvent, screen } from '@testing-library/react';
import { SystemsScreen } from '@/features/systems/systems-screen';
import { type FakeAnswer, fakeArchive, problem, renderScreen } from '../../support/fake-archive';
import { lorenzSystem, rosslerSystem } from '../../support/lorenz-fixtures';

const both: FakeAnswer = { body: { items: [rosslerSystem, lorenzSystem] } };

describe('the list of systems', () => {
  it('draws empty staves while it is on its way', async () => {
    fakeArchive({ 'GET /systems': 'never' });
    renderScreen(<SystemsScreen />);
    expect(await screen.findByText('Loading')).toBeTruthy();
  });

  it('shows every system by name, with its entries and how complete they are', async () => {
    fakeArchive({ 'GET /systems': both });
    renderScreen(<SystemsScreen />);
    const links = await screen.findAllByRole('link');
    expect(links.map((link) => link.getAttribute('href'))).toEqual(['/systems/lorenz', '/systems/rossler']);
    expect(screen.getByText('3 orbits')).toBeTruthy();
    expect(screen.getByText('no orbit yet')).toBeTruthy();
    expect(screen.getByText(/complete up to 3 returns/)).toBeTruthy();
  });

  it('finds a system in spite of a slip and without its accents', async () => {
    fakeArchive({ 'GET /systems': both });
    renderScreen(<SystemsScreen />);
    fireEvent.change(await screen.findByRole('searchbox', { name: 'Find a system' }), { target: { value: 'rosler' } });
    expect(await screen.findByText('1 of 2 systems')).toBeTruthy();
    expect(screen.getByRole('link').getAttribute('href')).toBe('/systems/rossler');
  });

  it('says when no system is called so, and leads back to all', async () => {
    fakeArchive({ 'GET /systems': both });
    renderScreen(<SystemsScreen />);
    fireEvent.change(await screen.findByRole('searchbox', { name: 'Find a system' }), { target: { value: 'qqqq' } });
    expect(screen.getByText(/No system is called anything like “qqqq”/)).toBeTruthy();
    fireEvent.click(screen.getByRole('button', { name: 'See all systems' }));
    expect(screen.getAllByRole('link')).toHaveLength(2);
  });

  it('says that the list did not answer, and tries again', async () => {
    let answer: FakeAnswer = problem(500, 'internal-error', 'Something broke on our side.');
    fakeArchive({ 'GET /systems': () => answer });
    renderScreen(<SystemsScreen />);
    expect(await screen.findByRole('heading', { name: 'The list of systems did not answer' })).toBeTruthy();
    answer = both;
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findAllByRole('link')).toHaveLength(2);
  });
});
