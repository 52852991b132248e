import { fireEvent, screen, waitFor } from '@testing-library/react';
import { DeskScreen } from '@/features/desk/desk-screen';
import { curator, sessionOf, submissionAB, submissionPage } from '../../support/desk-fixtures';
import { fakeArchive, type FakeAnswer, problem, renderScreen } from '../../support/fake-archive';
import { lorenzSystem } from '../../support/lorenz-fixtures';

const answers = (more: Record<string, FakeAnswer> = {}): Record<string, FakeAnswer> => ({
  'GET /session': { body: sessionOf({ ...curator, role: 'contributor' }) },
  'GET /submissions': { body: submissionPage(submissionAB) },
  'GET /systems/lorenz': { body: lorenzSystem },
  ...more,
});

describe('the Desk', () => {
  it('asks a stranger to sign in', async () => {
    fakeArchive(answers({ 'GET /session': { body: sessionOf(null) } }));
    renderScreen(<DeskScreen />);
    expect((await screen.findByRole('link', { name: 'Sign in' })).getAttribute('href')).toBe('/sign-in?next=/desk');
  });

  it('shows a submission with both of its states, by whose turn it is', async () => {
    fakeArchive(answers());
    renderScreen(<DeskScreen />);
    expect(await screen.findByRole('link', { name: 'Submission 41' })).toBeTruthy();
    expect(screen.getByRole('list', { name: 'A curator’s turn' })).toBeTruthy();
    expect(screen.queryByRole('heading', { name: 'Queue' })).toBeNull();
  });

  it('shows the queue to a curator', async () => {
    const calls = fakeArchive(answers({ 'GET /session': { body: sessionOf(curator) } }));
    renderScreen(<DeskScreen />);
    expect(await screen.findByRole('heading', { name: 'Queue' })).toBeTruthy();
    expect(calls.some(({ query }) => query.get('queue') === 'review')).toBe(true);
  });

  it('says what to do when there is nothing', async () => {
    fakeArchive(answers({ 'GET /submissions': { body: submissionPage() } }));
    renderScreen(<DeskScreen />);
    expect(await screen.findByText(/You have sent nothing yet/)).toBeTruthy();
  });

  it('says that the list did not come', async () => {
    const calls = fakeArchive(answers({ 'GET /submissions': problem(500, 'internal-error', 'Something broke.') }));
    renderScreen(<DeskScreen />);
    const retry = await screen.findByRole('button', { name: 'Try again' });
    const asked = () => calls.filter(({ path }) => path === '/submissions').length;
    const before = asked();
    fireEvent.click(retry);
    await waitFor(() => expect(asked()).toBeGreaterThan(before));
  });
});
