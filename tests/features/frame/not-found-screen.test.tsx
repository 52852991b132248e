import { screen } from '@testing-library/react';
import { NotFoundScreen } from '@/features/frame/not-found-screen';
import { renderScreen } from '../../support/fake-archive';

describe('an address that leads nowhere', () => {
  it('names it and leads on', () => {
    renderScreen(<NotFoundScreen path="/nowhere" />);
    expect(screen.getByRole('heading', { name: 'Nothing here' })).toBeTruthy();
    expect(screen.getByText('/nowhere')).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Search the catalogue' }).getAttribute('href')).toBe('/');
  });
});
