import { type Problem } from '@/server/errors';
import { readSearch } from '@/server/search/read-search';

const refusal = (query: Record<string, unknown>): Problem => {
  try {
    readSearch(query);
  } catch (error) {
    return error as Problem;
  }
  throw new Error('the query was understood');
};

describe('readSearch', () => {
  it('asks for nothing when nothing is given', () => {
    const { sort, parameters, ...rest } = readSearch({});
    expect(sort).toBe('newest');
    expect(parameters).toEqual([]);
    expect(new Set(Object.values(rest))).toEqual(new Set([null]));
  });

  it('sorts by period where a system is given, and by distance from a point', () => {
    expect(readSearch({ system: 'lorenz' }).sort).toBe('period');
    expect(readSearch({ system: 'lorenz', near: '1,2,3' }).sort).toBe('distance');
    expect(readSearch({ system: 'lorenz', sort: '-multiplier' }).sort).toBe('-multiplier');
  });

  it('reads everything that can be asked for', () => {
    expect(
      readSearch({
        system: 'lorenz',
        'parameters[rho]': '28',
        'parameters[beta]': '8/3',
        period: '1.5587',
        periodMin: '1.5',
        periodMax: '2e1',
        returns: '2..5',
        stability: 'saddle,stable',
        itinerary: 'BA',
        itineraryContains: 'BA',
        evidence: 're-integrated',
        text: ' Novak ',
        near: '-13.76, -19.57,+27',
      }),
    ).toEqual({
      system: 'lorenz',
      parameters: [
        ['beta', 8 / 3],
        ['rho', 28],
      ],
      period: { from: '155865e-5', to: '155875e-5' },
      periodMin: '1.5',
      periodMax: '2e1',
      returns: { from: 2, to: 5 },
      stability: ['stable', 'saddle'],
      itinerary: 'AB',
      itineraryContains: 'BA',
      evidence: ['re-integrated'],
      text: 'Novak',
      near: ['-13.76', '-19.57', '27'],
      sort: 'distance',
    });
  });

  it.each([
    ['period', 'abc'],
    ['period', '-1'],
    ['period', '8/3'],
    ['period', '9'.repeat(201)],
    ['periodMin', 'x'],
    ['periodMax', '1e1000'],
    ['returns', '0'],
    ['returns', '5..2'],
    ['returns', '10000'],
    ['returns', 'many'],
    ['stability', 'wobbly'],
    ['stability', 'saddle,'],
    ['itinerary', 'A-B'],
    ['evidence', 'sure'],
    ['text', 'x'.repeat(201)],
    ['text', 'a\u0000b'],
    ['near', '1,2,3'],
    ['near', '1,,3'],
    ['sort', 'colour'],
    ['sort', 'distance'],
    ['system', "' or 1=1"],
    ['parameters[rho]', 'big'],
    ['parameters[rho]', '1/0'],
    ['parameters[a b]', '1'],
    ['colour', 'blue'],
    ['__proto__', '1'],
  ])('names %s=%s', (name, value) => {
    const query = Object.create(null) as Record<string, unknown>;
    query[name] = value;
    const problem = refusal(query);
    expect(problem.code).toBe('invalid-query');
    expect(problem.errors.map(({ pointer }) => pointer)).toEqual([`#${name}`]);
  });

  it('names a parameter that is given twice', () => {
    expect(refusal({ period: ['1', '2'] }).errors[0]?.message).toBe('period is given more than once.');
  });

  it('names every wrong parameter at once', () => {
    expect(refusal({ period: 'x', returns: 'y', colour: 'z' }).errors).toHaveLength(3);
  });
});
