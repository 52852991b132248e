import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { SubmissionScreen } from '@/features/desk/submission-screen';
import type { Submission } from '@/schemas/generated/contract';
import { curator, sessionOf, submissionAB, submissionPage } from '../../support/desk-fixtures';
import { fakeArchive, type FakeAnswer, problem, renderScreen } from '../../support/fake-archive';
import { entryAAB, lorenzSystem, pageOf, traceAB } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const mockPush = jest.fn();
jest.mock('expo-router', () => ({
  router: { push: (...to: unknown[]) => mockPush(...to) },
}));

const answers = (submission: Submission, more: Record<string, FakeAnswer> = {}): Record<string, FakeAnswer> => ({
  'GET /session': { body: sessionOf(curator) },
  'GET /systems': { body: { items: [lorenzSystem] } },
  'GET /submissions': { body: submissionPage() },
  'GET /submissions/s1': { body: submission, headers: { ETag: '"v3-a"' } },
  'GET /checks/c1/trace': { body: traceAB },
  'GET /orbits': { body: pageOf(entryAAB) },
  'POST /submissions/s1/claim': { body: submission, headers: { ETag: '"v3-a"' } },
  ...more,
});

beforeEach(() => {
  windowWidth(1200);
  sessionStorage.clear();
});

const show = () => renderScreen(<SubmissionScreen submissionId="s1" />);
const choose = async (name: RegExp) => fireEvent.click(await screen.findByRole('radio', { name }));

describe('the page of a submission', () => {
  it('records an acceptance under the version that was read', async () => {
    const accepted: Submission = { ...submissionAB, reviewState: 'accepted', turn: null, accession: 'RTN-00000175' };
    const calls = fakeArchive(
      answers(submissionAB, { 'POST /submissions/s1/decision': { body: accepted, headers: { ETag: '"v4-b"' } } }),
    );
    show();
    await choose(/Accept/);
    fireEvent.click(screen.getByRole('button', { name: 'Accept as the next entry' }));
    expect(await screen.findByRole('link', { name: 'RTN-00000175' })).toBeTruthy();
    const decided = calls.find(({ path }) => path.endsWith('/decision'));
    expect(decided).toMatchObject({ body: { decision: 'accept' }, headers: { 'If-Match': '"v3-a"' } });
  });

  it('does not decline without words', async () => {
    const calls = fakeArchive(answers(submissionAB));
    show();
    await choose(/Decline/);
    fireEvent.click(screen.getByRole('button', { name: 'Decline' }));
    expect(screen.getByText('A reason in words is needed.')).toBeTruthy();
    expect(calls.some(({ path }) => path.endsWith('/decision'))).toBe(false);
  });

  it('selects by a key, and records nothing by it', async () => {
    const calls = fakeArchive(answers(submissionAB));
    show();
    await screen.findByRole('heading', { name: 'Decision' });
    fireEvent.keyDown(window, { key: 'r' });
    expect(await screen.findByRole('button', { name: 'Return to the contributor' })).toBeTruthy();
    expect(document.activeElement).toBe(screen.getByLabelText(/Reason, shown/));
    expect(calls.some(({ path }) => path.endsWith('/decision'))).toBe(false);
  });

  it('records by Ctrl Enter from anywhere, once it is chosen', async () => {
    const accepted: Submission = { ...submissionAB, reviewState: 'accepted', turn: null, accession: 'RTN-00000175' };
    const calls = fakeArchive(
      answers(submissionAB, { 'POST /submissions/s1/decision': { body: accepted, headers: { ETag: '"v4-b"' } } }),
    );
    show();
    await screen.findByRole('heading', { name: 'Decision' });
    fireEvent.keyDown(window, { key: 'Enter', ctrlKey: true });
    expect(calls.some(({ path }) => path.endsWith('/decision'))).toBe(false);
    fireEvent.keyDown(window, { key: 'a' });
    fireEvent.keyDown(window, { key: 'Enter', ctrlKey: true });
    await waitFor(() => expect(calls.some(({ path }) => path.endsWith('/decision'))).toBe(true));
  });

  it('keeps the text when the submission changed meanwhile', async () => {
    const changed = problem(412, 'precondition-failed', 'It has changed meanwhile.');
    fakeArchive(answers(submissionAB, { 'POST /submissions/s1/decision': changed }));
    show();
    await choose(/Return/);
    const text = screen.getByLabelText(/Reason, shown/);
    fireEvent.change(text, { target: { value: 'Please give the section.' } });
    fireEvent.click(screen.getByRole('button', { name: 'Return to the contributor' }));
    expect(await screen.findByText(/Not recorded/)).toBeTruthy();
    expect((text as HTMLTextAreaElement).value).toBe('Please give the section.');
  });

  it('lets nobody decide on their own', async () => {
    fakeArchive(answers({ ...submissionAB, isMine: true }));
    show();
    expect(await screen.findByText('You own this submission; another curator decides.')).toBeTruthy();
    expect(screen.queryByRole('radio', { name: /Accept/ })).toBeNull();
  });

  it('does not accept on a stale report, and offers to check again', async () => {
    fakeArchive(answers({ ...submissionAB, checkState: 'stale', reportIsCurrent: false }));
    show();
    expect((await screen.findByRole<HTMLInputElement>('radio', { name: /Accept/ })).disabled).toBe(true);
    expect(screen.getByRole('button', { name: 'Check again' })).toBeTruthy();
  });

  it('opens a returned one on the reason, with the form', async () => {
    const decision = {
      decision: 'return',
      reason: 'description-lacking',
      comment: 'Which section?',
      by: 'Paul',
      at: submissionAB.createdAt,
    } as const;
    fakeArchive(answers({ ...submissionAB, isMine: true, reviewState: 'returned', turn: 'contributor', decision }));
    show();
    expect(await screen.findByText('Which section?')).toBeTruthy();
    expect(screen.getByRole('button', { name: 'Send again' })).toBeTruthy();
  });

  it('says that there is no such submission', async () => {
    fakeArchive({
      ...answers(submissionAB),
      'GET /submissions/s1': problem(404, 'not-found', 'There is nothing at this address.'),
    });
    show();
    await waitFor(() => expect(screen.getByText(/There is nothing at this address/)).toBeTruthy());
  });

  it('keeps what was written until it is recorded', async () => {
    fakeArchive(answers(submissionAB));
    const first = show();
    fireEvent.change(await screen.findByLabelText(/Reason, shown/), { target: { value: 'Half a sen' } });
    first.unmount();
    show();
    expect((await screen.findByLabelText<HTMLTextAreaElement>(/Reason, shown/)).value).toBe('Half a sen');
  });

  it('opens the next one that waits once a decision is recorded', async () => {
    const accepted: Submission = { ...submissionAB, reviewState: 'accepted', turn: null, accession: 'RTN-00000175' };
    fakeArchive(
      answers(submissionAB, {
        'GET /submissions': { body: submissionPage(submissionAB, { ...submissionAB, id: 's2', number: 42 }) },
        'POST /submissions/s1/decision': { body: accepted, headers: { ETag: '"v4-b"' } },
      }),
    );
    show();
    await choose(/Accept/);
    fireEvent.click(screen.getByRole('button', { name: 'Accept as the next entry' }));
    await waitFor(() => expect(mockPush).toHaveBeenCalledWith('/desk/s2'));
  });

  it('decides from a sheet on a phone', async () => {
    windowWidth(390);
    const returned: Submission = { ...submissionAB, reviewState: 'returned', turn: 'contributor' };
    const calls = fakeArchive(
      answers(submissionAB, { 'POST /submissions/s1/decision': { body: returned, headers: { ETag: '"v4-b"' } } }),
    );
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Return' }));
    const sheet = screen.getByRole('dialog', { name: 'Return submission 41' });
    fireEvent.change(within(sheet).getByLabelText(/Reason, shown/), { target: { value: 'Which section?' } });
    fireEvent.click(within(sheet).getByRole('button', { name: 'Return to the contributor' }));
    await waitFor(() => expect(calls.find(({ path }) => path.endsWith('/decision'))).toBeTruthy());
    expect(calls.find(({ path }) => path.endsWith('/decision'))?.body).toMatchObject({
      decision: 'return',
      comment: 'Which section?',
    });
  });
});
