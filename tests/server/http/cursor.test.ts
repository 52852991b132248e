import { Problem } from '@/server/errors';
import { decodeCursor, encodeCursor } from '@/server/http/cursor';

const query = { system: 'lorenz', sort: 'period' };

describe('a cursor', () => {
  it('gives back the values it was made of', () => {
    expect(decodeCursor(query, encodeCursor(query, ['1.5586522107161747', null]), 2)).toEqual([
      '1.5586522107161747',
      null,
    ]);
  });

  it('belongs to its query', () => {
    const cursor = encodeCursor(query, ['1', '2']);
    expect(() => decodeCursor({ ...query, sort: 'returns' }, cursor, 2)).toThrow(/belongs to another search/);
  });

  it.each([
    ['nonsense', 'abc'],
    ['nothing', ''],
    ['JSON of another kind', Buffer.from('{}').toString('base64url')],
    ['too few values', encodeCursor(query, ['1'])],
    ['a value changed by hand', Buffer.from(swap(encodeCursor(query, ['1', '2']))).toString('base64url')],
  ])('refuses %s at #after', (_, cursor) => {
    let caught: unknown;
    try {
      decodeCursor(query, cursor, 2);
    } catch (error) {
      caught = error;
    }
    expect(caught).toBeInstanceOf(Problem);
    expect((caught as Problem).errors[0]?.pointer).toBe('#after');
  });
});

function swap(cursor: string): string {
  return Buffer.from(cursor, 'base64url').toString('utf8').replace('"2"]', '"3"]');
}
