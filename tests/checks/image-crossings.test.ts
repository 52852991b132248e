import { imageCrossings } from '@/server/checks/image-crossings';
import { parseFormula } from '@/server/formulas/parse-formula';
import type { Expression } from '@/server/numerics/expression/expression';

function formula(text: string): Expression {
  const parsed = parseFormula(text, new Set(['q', 'p', 'a', 'r']));
  if (!parsed.ok) throw new Error(parsed.error.message);
  return parsed.expression;
}

const system = {
  variables: [
    { name: 'q', modulus: null },
    { name: 'p', modulus: null },
  ],
  definitions: [{ name: 'r', expression: formula('a*q') }],
};
const points = [
  ['1', '2'],
  ['3', '-4'],
];

describe('the image of an orbit', () => {
  it('is that of each crossing, with parameters and definitions in the map', () => {
    const map = [formula('-q'), formula('p + r')];
    expect(imageCrossings(points, system, { map, reversesTime: false }, new Map([['a', 0.5]]))).toEqual([
      ['-1', '2.5'],
      ['-3', '-2.5'],
    ]);
  });

  it('is run through backwards where the symmetry turns time round', () => {
    const map = [formula('q'), formula('-p')];
    expect(imageCrossings(points, system, { map, reversesTime: true }, new Map([['a', 1]]))).toEqual([
      ['3', '4'],
      ['1', '-2'],
    ]);
  });
});
