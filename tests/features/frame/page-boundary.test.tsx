import { screen } from '@testing-library/react';
import { PageBoundary } from '@/features/frame/page-boundary';
import { fakeArchive, renderScreen } from '../../support/fake-archive';

function Breaks({ message }: { message: string }): never {
  throw new Error(message);
}

beforeEach(() => {
  fakeArchive({});
  jest.spyOn(console, 'error').mockImplementation(() => undefined);
});
afterEach(() => jest.restoreAllMocks());

describe('the boundary around a page', () => {
  it('says that a page broke, and lets one go on to another', () => {
    const { redraw } = renderScreen(
      <PageBoundary path="/desk">
        <Breaks message="No such thing." />
      </PageBoundary>,
    );
    expect(screen.getByText('No such thing. Nothing you sent was lost.')).toBeTruthy();
    redraw(
      <PageBoundary path="/systems">
        <p>the systems</p>
      </PageBoundary>,
    );
    expect(screen.getByText('the systems')).toBeTruthy();
  });

  it('takes code that did not come for a lost connection', () => {
    renderScreen(
      <PageBoundary path="/desk">
        <Breaks message="Loading module https://orbits.example.org/index.js failed." />
      </PageBoundary>,
    );
    expect(screen.getByRole('heading', { name: 'No connection' })).toBeTruthy();
    expect(screen.queryByText(/Loading module/)).toBeNull();
  });
});
