import { orbitState, stateLook } from '@/features/notation/orbit-state';

describe('orbitState', () => {
  it.each([
    ['draft', 'none', null, 'draft'],
    ['draft', 'done', 'does-not-close', 'does-not-close'],
    ['submitted', 'queued', null, 'queued'],
    ['submitted', 'running', null, 'checking'],
    ['submitted', 'done', 'closes-after-correction', 'closes-after-correction'],
    ['submitted', 'failed', null, 'failed'],
    ['in-review', 'running', 'closes', 'in-review'],
    ['accepted', 'stale', 'closes', 'accepted'],
    ['returned', 'done', 'closes', 'returned'],
  ] as const)('%s with a check that is %s and says %s is drawn as %s', (review, check, verdict, state) => {
    expect(orbitState(review, check, verdict)).toBe(state);
  });

  it('gives every state a word, and a barline that colour does not carry alone', () => {
    const byBarline = (name: string) => Object.values(stateLook).filter(({ barline }) => barline === name);
    expect(byBarline('repeat').map(({ word }) => word)).toEqual(['accepted']);
    expect(byBarline('broken').map(({ word }) => word)).toEqual(['does not close', 'declined']);
    expect(byBarline('dashed').map(({ word }) => word)).toEqual(['draft', 'returned', 'withdrawn']);
  });
});
