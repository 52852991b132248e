import { fireEvent, screen, waitFor } from '@testing-library/react';
import { DraftEditor } from '@/features/desk/draft-editor';
import type { Submission } from '@/schemas/generated/contract';
import { submissionAB } from '../../support/desk-fixtures';
import { fakeArchive, type FakeAnswer, renderScreen } from '../../support/fake-archive';
import { lorenzSystem } from '../../support/lorenz-fixtures';

const draft: Submission = {
  ...submissionAB,
  isMine: true,
  reviewState: 'draft',
  turn: 'contributor',
  report: null,
  check: null,
};

const show = () => renderScreen(<DraftEditor submission={draft} etag={'"v1"'} systems={[lorenzSystem]} />);
const period = () => screen.getByLabelText<HTMLInputElement>('Period T');
const type = (value: string) => fireEvent.change(period(), { target: { value } });

beforeEach(() => localStorage.clear());

describe('a draft on the Desk', () => {
  it('is saved once the typing rests', async () => {
    const calls = fakeArchive({ 'PATCH /submissions/s1': { body: draft, headers: { ETag: '"v2"' } } });
    show();
    type('3.14159');
    expect(screen.getByText(/not saved yet/)).toBeTruthy();
    await screen.findByText(/· saved$/, undefined, { timeout: 3000 });
    expect(calls.find(({ method }) => method === 'PATCH')).toMatchObject({
      body: { period: '3.14159' },
      headers: { 'If-Match': '"v1"' },
    });
  });

  it('comes back as typed when the server never got it', async () => {
    let answer: FakeAnswer = 'offline';
    fakeArchive({ 'PATCH /submissions/s1': () => answer });
    const first = show();
    type('2.71828');
    await screen.findByText(/not saved, kept on this device/, undefined, { timeout: 3000 });
    first.unmount();

    answer = { body: draft, headers: { ETag: '"v2"' } };
    const second = show();
    expect(period().value).toBe('2.71828');
    await screen.findByText(/· saved$/, undefined, { timeout: 3000 });
    second.unmount();

    // What the server has is not kept here any more.
    show();
    await waitFor(() => expect(period().value).toBe(draft.body['period']));
  });
});
