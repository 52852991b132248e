import { fireEvent, screen, waitFor } from '@testing-library/react';
import { BenchScreen } from '@/features/bench/bench-screen';
import { checkAB, sessionOf } from '../../support/desk-fixtures';
import { fakeArchive, type FakeAnswer, problem, renderScreen } from '../../support/fake-archive';
import { lorenzSystem, traceAB } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const answers = (more: Record<string, FakeAnswer> = {}): Record<string, FakeAnswer> => ({
  'GET /systems': { body: { items: [lorenzSystem] } },
  'GET /session': { body: sessionOf(null) },
  'POST /checks': { body: checkAB },
  'GET /checks/c1': { body: checkAB },
  'GET /checks/c1/trace': { body: traceAB },
  ...more,
});

const show = () => renderScreen(<BenchScreen system="lorenz" from={null} />);
const type = async (label: string | RegExp, text: string) =>
  fireEvent.change(await screen.findByLabelText(label), { target: { value: text } });

beforeEach(() => {
  localStorage.clear();
  windowWidth(1440);
});

describe('the Bench', () => {
  it('waits under its title while the systems are on their way', async () => {
    fakeArchive(answers({ 'GET /systems': 'never' }));
    show();
    expect(await screen.findByRole('heading', { name: 'Bench' })).toBeTruthy();
  });

  it('says that the systems did not come, and tries again', async () => {
    const calls = fakeArchive(answers({ 'GET /systems': problem(500, 'internal-error', 'Something broke.') }));
    show();
    const asked = () => calls.filter(({ path }) => path === '/systems').length;
    const retry = await screen.findByRole('button', { name: 'Try again' });
    const before = asked();
    fireEvent.click(retry);
    await waitFor(() => expect(asked()).toBeGreaterThan(before));
    expect(screen.getByText(/kept on this device/, { selector: 'div' })).toBeTruthy();
  });

  it('sends the form as typed and shows the report', async () => {
    const calls = fakeArchive(answers());
    show();
    await type('x', '-13.7636');
    await type('y', '8/3');
    await type('z', '27');
    await type('Period T', '1.55860');
    fireEvent.click(screen.getByRole('button', { name: 'Check this orbit' }));
    expect(await screen.findByRole('heading', { name: 'Closes' })).toBeTruthy();
    expect(calls.find(({ method }) => method === 'POST')?.body).toEqual({
      system: 'lorenz',
      section: 'z-27',
      point: ['-13.7636', '8/3', '27'],
      period: '1.55860',
    });
    expect(screen.getByRole('link', { name: 'Sign in to send' })).toBeTruthy();
  });

  it('keeps what was typed for the next visit', async () => {
    fakeArchive(answers());
    const { unmount } = show();
    await type('Period T', '1.55');
    unmount();
    show();
    expect((await screen.findByLabelText<HTMLInputElement>('Period T')).value).toBe('1.55');
  });

  it('shows a refusal at the field that it is about', async () => {
    const refused = problem(422, 'invalid-content', 'Something in the body cannot be right.') as { body: object };
    const errors = [{ pointer: '/period', message: 'The period must be positive.', position: null }];
    fakeArchive(answers({ 'POST /checks': { ...refused, status: 422, body: { ...refused.body, errors } } }));
    show();
    await type('Period T', '-1');
    fireEvent.click(screen.getByRole('button', { name: 'Check this orbit' }));
    const field = await screen.findByLabelText('Period T');
    await waitFor(() => expect(field.getAttribute('aria-invalid')).toBe('true'));
    expect(screen.getAllByText('The period must be positive.').length).toBeGreaterThan(0);
    expect((field as HTMLInputElement).value).toBe('-1');
  });

  it('marks what is no number while one types', async () => {
    fakeArchive(answers());
    show();
    await type('Period T', '1,5');
    expect(await screen.findByText(/not a number/)).toBeTruthy();
  });
});
