import { fireEvent, screen } from '@testing-library/react';
import { SystemScreen } from '@/features/systems/system-screen';
import { type FakeAnswer, fakeArchive, problem, renderScreen } from '../../support/fake-archive';
import { entryAB, lorenzSystem, pageOf, rosslerSystem } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const answers: Record<string, FakeAnswer> = {
  'GET /systems/lorenz': { body: lorenzSystem },
  'GET /orbits': { body: pageOf(entryAB) },
};

beforeEach(() => windowWidth(1440));

describe('the page of a system', () => {
  it('draws empty staves while it is on its way', async () => {
    fakeArchive({ 'GET /systems/lorenz': 'never' });
    renderScreen(<SystemScreen slug="lorenz" />);
    expect(await screen.findByText('Loading')).toBeTruthy();
  });

  it('shows equations with their plain text as the name, symmetry and section', async () => {
    fakeArchive(answers);
    renderScreen(<SystemScreen slug="lorenz" />);
    expect(await screen.findByLabelText(/x' = sigma\*\(y - x\)/)).toBeTruthy();
    expect(screen.getByText(/half-turn/)).toBeTruthy();
    expect(screen.getAllByText('z-27').length).toBeGreaterThan(0);
  });

  it('leads from a number of returns to that search, and to all orbits and the Bench', async () => {
    fakeArchive(answers);
    renderScreen(<SystemScreen slug="lorenz" />);
    const row = await screen.findByRole('link', { name: '3 returns: 2 of 2' });
    expect(row.getAttribute('href')).toBe('/?q=lorenz+3+returns');
    expect(screen.getByRole('link', { name: 'See its 3 orbits' }).getAttribute('href')).toBe('/?q=lorenz');
    expect(screen.getByRole('link', { name: 'Check an orbit of it' }).getAttribute('href')).toBe(
      '/bench?system=lorenz',
    );
  });

  it('shows the shortest orbit', async () => {
    fakeArchive(answers);
    renderScreen(<SystemScreen slug="lorenz" />);
    expect((await screen.findByRole('link', { name: 'RTN-0000001X' })).getAttribute('href')).toBe(
      '/orbits/RTN-0000001X',
    );
  });

  it('says that nothing is known yet of a system without entries', async () => {
    fakeArchive({ 'GET /systems/rossler': { body: rosslerSystem }, 'GET /orbits': { body: pageOf() } });
    renderScreen(<SystemScreen slug="rossler" />);
    expect(await screen.findByText('No orbit of this system is in the catalogue yet.')).toBeTruthy();
    expect(screen.queryByRole('link', { name: /See its/ })).toBeNull();
  });

  it('says that there is no such system', async () => {
    fakeArchive({});
    renderScreen(<SystemScreen slug="nowhere" />);
    expect(await screen.findByRole('heading', { name: 'Nothing here' })).toBeTruthy();
    expect(screen.getByText('nowhere')).toBeTruthy();
  });

  it('says that the system did not answer, and tries again', async () => {
    let answer: FakeAnswer = problem(500, 'internal-error', 'Something broke on our side.');
    fakeArchive({ ...answers, 'GET /systems/lorenz': () => answer });
    renderScreen(<SystemScreen slug="lorenz" />);
    expect(await screen.findByRole('heading', { name: 'The system did not answer' })).toBeTruthy();
    answer = answers['GET /systems/lorenz']!;
    fireEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByLabelText(/x' = sigma/)).toBeTruthy();
  });
});
