import { completenessOf } from '@/features/catalogue/completeness-of';
import { lorenzSystem } from '../../support/lorenz-fixtures';

describe('completenessOf', () => {
  it('is complete up to the last number of returns before one is missing', () => {
    expect(completenessOf(lorenzSystem)).toMatchObject({ kind: 'complete', upTo: 3, known: 3, allowed: 3 });
  });

  it('counts what is known where the first is missing', () => {
    const [table] = lorenzSystem.knownByReturns;
    const rows = [
      { returns: 2, known: 0, allowed: 1 },
      { returns: 3, known: 1, allowed: 2 },
      { returns: 4, known: 0, allowed: 3 },
    ];
    const system = { ...lorenzSystem, knownByReturns: [{ ...table!, rows }] };
    expect(completenessOf(system)).toMatchObject({ kind: 'partial', upTo: 3, known: 1, allowed: 3 });
  });

  it('does not claim what nobody has counted', () => {
    const [table] = lorenzSystem.knownByReturns;
    const rows = [{ returns: 2, known: 5, allowed: null }];
    const system = { ...lorenzSystem, knownByReturns: [{ ...table!, known: 5, rows }] };
    expect(completenessOf(system)).toMatchObject({ kind: 'unknown', known: 5 });
  });

  it('says nothing of parameters that have no entries', () => {
    expect(completenessOf(lorenzSystem, { rho: '160' })).toBeNull();
  });
});
