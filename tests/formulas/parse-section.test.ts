import { checkSystem } from '@/server/formulas/check-system';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import { parseSection } from '@/server/formulas/parse-section';

function system(): CheckedSystem {
  const checked = checkSystem({
    name: 'three coordinates',
    variables: [{ name: 'x' }, { name: 'y' }, { name: 'z' }],
    parameters: [{ name: 'c', value: '2' }],
    definitions: [
      { name: 'level', formula: 'c + 1' },
      { name: 'height', formula: 'z' },
    ],
    equations: { x: 'y', y: '-x', z: 'c' },
    sections: [{ name: 'z-27', formula: 'z - 27', letters: [{ letter: 'A', where: '-x' }] }],
  });
  if (!checked.ok) throw new Error(checked.errors[0]?.message);
  return checked.system;
}

const plane = (normal: (string | number)[], through: (string | number)[]) =>
  parseSection(system(), { plane: { normal, through } });

describe('parseSection', () => {
  it('finds a section by its name', () => {
    expect(parseSection(system(), 'z-27')).toMatchObject({ ok: true, section: { name: 'z-27', formula: 'z - 27' } });
  });

  it.each([
    ['spaces and parentheses', { formula: '((z)-27)' }],
    ['a number written otherwise', { formula: 'z - 2.70e1' }],
    ['a plane', { plane: { normal: ['0', '0', '1'], through: ['0', '0', '27'] } }],
    ['a plane with JSON numbers', { plane: { normal: [0, 0, 1], through: [5, 6, 27] } }],
  ])('gives the letters of a named section to %s that equals it', (_, choice) => {
    expect(parseSection(system(), choice)).toMatchObject({
      ok: true,
      section: { name: 'z-27', letters: [{ letter: 'A' }] },
    });
  });

  it.each([
    ['z - 27.5', 'z - 27.5'],
    ['27 - z', '27 - z'],
    ['2*(z - 27)', '2*(z - 27)'],
    ['height - level', 'height - level'],
  ])('takes %s as a section of its own, without letters', (formula, canonical) => {
    expect(parseSection(system(), { formula })).toMatchObject({
      ok: true,
      section: { name: null, formula: canonical, letters: [] },
    });
  });

  it('writes a plane with its numbers as typed', () => {
    expect(plane(['1/3', '0', '-2.50'], ['+1', '9', '-4'])).toMatchObject({
      section: { formula: '1/3*(x - 1) + -2.50*(z - -4)' },
    });
  });

  it.each([
    ['a number', { formula: '0' }, '/section/formula', /holds no variable/],
    ['a parameter', { formula: 'level - c' }, '/section/formula', /holds no variable/],
    ['a broken formula', { formula: 'z -' }, '/section/formula', /ends too early/],
    ['a function that is not smooth', { formula: 'abs(z)' }, '/section/formula', /smooth/],
    [
      'a coordinate that is no number',
      { plane: { normal: ['0', '0', '1'], through: ['0', '0', 'high'] } },
      '/section/plane/through/2',
      /not a number/,
    ],
    ['a property of every object', 'constructor', '/section', /no section constructor/],
  ])('refuses %s', (_, choice, pointer, message) => {
    expect(parseSection(system(), choice)).toMatchObject({
      ok: false,
      errors: expect.arrayContaining([expect.objectContaining({ pointer, message: expect.stringMatching(message) })]),
    });
  });
});
