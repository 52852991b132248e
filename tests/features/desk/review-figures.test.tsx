import { screen } from '@testing-library/react';
import { ReviewSection } from '@/features/desk/review-figures';
import { submissionAB } from '../../support/desk-fixtures';
import { fakeArchive, renderScreen } from '../../support/fake-archive';
import { laidOut } from '../../support/laid-out';
import { entryAAB, lorenzSystem, pageOf, traceAB } from '../../support/lorenz-fixtures';

beforeAll(() => laidOut(480));

it('draws a submission on its section beside the crossings of the nearest entries', async () => {
  fakeArchive({ 'GET /checks/c1/trace': { body: traceAB }, 'GET /orbits': { body: pageOf(entryAAB) } });
  renderScreen(<ReviewSection submission={submissionAB} system={lorenzSystem} />);
  const words = new RegExp(`crossings on the section: x from .*; beside those of ${entryAAB.accession}$`);
  expect(await screen.findByRole('img', { name: words })).toBeTruthy();
  expect(screen.getByText('tangency', { selector: '[stroke]' })).toBeTruthy();
});
