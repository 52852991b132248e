import Fuse from 'fuse.js';
import { createSearchParser } from '@/features/catalogue/parse-search-line';
import { removeTerm, replaceTerm } from '@/features/catalogue/edit-search-line';
import { searchFilter } from '@/features/catalogue/search-filter';
import type { SearchableSystem } from '@/features/catalogue/search-term';

const systems: SearchableSystem[] = [
  { slug: 'lorenz', name: 'Lorenz', parameters: ['sigma', 'rho', 'beta'], letters: ['A', 'B'] },
  { slug: 'rossler', name: 'Rössler', parameters: ['a', 'b', 'c'], letters: ['0', '1'] },
  { slug: 'henon-heiles', name: 'Hénon–Heiles', parameters: [], letters: [] },
  { slug: 'three-body-planar', name: 'Three bodies in the plane', parameters: ['m1'], letters: [] },
  { slug: 'cr3bp-planar', name: 'Restricted three-body problem, planar', parameters: ['mu'], letters: [] },
  { slug: 'cr3bp-spatial', name: 'Restricted three-body problem, spatial', parameters: ['mu'], letters: [] },
];
const parse = createSearchParser(systems, Fuse);
const kinds = (text: string) => parse(text).map(({ start: _start, end: _end, ...meaning }) => meaning);
const asked = (text: string) => searchFilter(parse(text));

describe('the search line', () => {
  it('reads a system, returns and a range of periods', () => {
    expect(kinds('lorenz 9 returns 6.6 to 6.75')).toEqual([
      { kind: 'system', slug: 'lorenz', name: 'Lorenz' },
      { kind: 'returns', min: '9', max: '9' },
      { kind: 'period-range', min: '6.6', max: '6.75' },
    ]);
  });

  it.each([
    ['1.5587', { period: '1.5587' }],
    ['period 1.5587', { period: '1.5587' }],
    ['T = 1.5587', { period: '1.5587' }],
    ['6.6..6.75', { periodMin: '6.6', periodMax: '6.75' }],
    ['between 6.6 and 6.75', { periodMin: '6.6', periodMax: '6.75' }],
    ['period from 6.6', { periodMin: '6.6' }],
    ['> 6.6', { periodMin: '6.6' }],
    ['period up to 6.75', { periodMax: '6.75' }],
    ['returns 9', { returns: '9' }],
    ['1 return', { returns: '1' }],
    ['3 to 5 returns', { returns: '3..5' }],
    ['returns 3..5', { returns: '3..5' }],
    ['contains AAB', { itineraryContains: 'AAB' }],
    ['stable or saddle', { stability: 'stable,saddle' }],
    ['refined', { evidence: 'refined,proved' }],
    ['AAB', { itinerary: 'AAB' }],
    ['itinerary 011', { itinerary: '011' }],
    ['saddle', { stability: 'saddle' }],
    ['proved', { evidence: 'proved' }],
    ['-13.76, -19.58, 27', { near: '-13.76,-19.58,27' }],
    ['(−13.76, −19.58, 27)', { near: '-13.76,-19.58,27' }],
    ['near -13.76 -19.58 27', { near: '-13.76,-19.58,27' }],
    ['"saddle point" convection', { text: 'saddle point convection' }],
    ['convection', { text: 'convection' }],
    ['', {}],
    ['  ,  ', {}],
  ])('reads %p', (text, filter) => {
    expect(asked(text)).toEqual(filter);
  });

  it.each([
    ['Lorenz', 'lorenz'],
    ['lornez', 'lorenz'],
    ['lor', 'lorenz'],
    ['rossler', 'rossler'],
    ['RÖSSLER', 'rossler'],
    ['henon heiles', 'henon-heiles'],
    ['three-body-planar', 'three-body-planar'],
    ['three bodies in the plane', 'three-body-planar'],
    ['cr3bp spatial', 'cr3bp-spatial'],
  ])('finds the system in %p', (text, slug) => {
    expect(asked(text)).toEqual({ system: slug });
  });

  it('does not guess between two systems that begin alike', () => {
    expect(asked('cr3bp')).toEqual({ text: 'cr3bp' });
  });

  it('reads a parameter of the system named, in Latin or Greek letters', () => {
    expect(asked('lorenz rho=28 β 8/3')).toEqual({ system: 'lorenz', parameters: { rho: '28', beta: '8/3' } });
    expect(asked('rossler c 5.7 2 returns')).toEqual({ system: 'rossler', parameters: { c: '5.7' }, returns: '2' });
  });

  it('does not take a name for a parameter of another system', () => {
    expect(asked('rossler rho=28')).toEqual({ system: 'rossler', text: 'rho=28' });
  });

  it('takes digits for an itinerary only where they cannot be a number', () => {
    expect(asked('rossler 011')).toEqual({ system: 'rossler', itinerary: '011' });
    expect(asked('rossler 11')).toEqual({ system: 'rossler', period: '11' });
    expect(asked('lorenz 011')).toEqual({ system: 'lorenz', period: '011' });
  });

  it('reads an accession and forgives a missing hyphen', () => {
    expect(kinds('rtn0000001x')).toEqual([{ kind: 'accession', value: 'RTN-0000001X' }]);
  });

  it('searches a second number as words', () => {
    expect(asked('1.5587 2.3')).toEqual({ period: '1.5587', text: '2.3' });
  });

  it('keeps every digit that was typed', () => {
    expect(asked('1.55865221071617472800')).toEqual({ period: '1.55865221071617472800' });
  });

  it('says where each term stands', () => {
    const text = 'lorenz  9 returns  6.6 to 6.75';
    expect(parse(text).map(({ start, end }) => text.slice(start, end))).toEqual(['lorenz', '9 returns', '6.6 to 6.75']);
  });
});

describe('editing the search line', () => {
  const text = 'lorenz 9 returns 6.6 to 6.75 convection';

  it('removes the words of one term', () => {
    expect(removeTerm(text, parse(text)[1]!)).toBe('lorenz 6.6 to 6.75 convection');
  });

  it('writes new words in the place of the old ones', () => {
    expect(replaceTerm(text, parse(text), { kinds: ['period', 'period-range'], words: '6 to 7' })).toBe(
      'lorenz 9 returns 6 to 7 convection',
    );
  });

  it('writes words for a new kind at the end', () => {
    expect(replaceTerm(text, parse(text), { kinds: ['stability'], words: 'saddle' })).toBe(`${text} saddle`);
  });

  it('takes a term out when there are no words for it', () => {
    expect(replaceTerm(text, parse(text), { kinds: ['returns'], words: '' })).toBe('lorenz 6.6 to 6.75 convection');
  });
});
