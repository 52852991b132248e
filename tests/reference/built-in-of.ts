import type { ReferenceCase } from '@/tests/reference/reference-case';

interface Rule {
  slug: string;
  variables: string;
  /** The right-hand side of one variable tells the family; that all of them agree is tested. */
  variable: string;
  equation: string;
  /** Parameters of the built-in system in terms of the case's. */
  parameters?: (given: Record<string, string>) => Record<string, string>;
  /** `expression` or `-(expression)` of the case → the section's name. */
  sections: Record<string, string>;
}

const negated = (text: string) => (text.startsWith('-') ? text.slice(1) : `-${text}`);
const primaries = { y: 'y-up', '-(y)': 'y-down' };

const RULES: Rule[] = [
  {
    slug: 'lorenz',
    variables: 'x,y,z',
    variable: 'x',
    equation: 'sigma*(y-x)',
    sections: { 'z-27': 'z-27', 'z-159': 'z-rho-1' },
  },
  {
    slug: 'rossler',
    variables: 'x,y,z',
    variable: 'x',
    equation: '-(y+z)',
    parameters: ({ a = '', b = '' }) => ({ a: b, b, c: a }),
    sections: { x: 'x-up' },
  },
  {
    slug: 'henon-heiles',
    variables: 'x,y,px,py',
    variable: 'py',
    equation: '-y-x^2+y^2',
    sections: { x: 'x-up', y: 'y-up' },
  },
  { slug: 'van-der-pol', variables: 'x,y', variable: 'y', equation: 'mu*(1-x^2)*y-x', sections: { '-(y)': 'y-down' } },
  {
    slug: 'cr3bp-planar',
    variables: 'x,y,vx,vy',
    variable: 'vy',
    equation: 'y-2*vx-(1-mu)*y/((x+mu)^2+y^2)^(3/2)-mu*y/((x-1+mu)^2+y^2)^(3/2)',
    sections: primaries,
  },
  {
    slug: 'cr3bp-spatial',
    variables: 'x,y,z,vx,vy,vz',
    variable: 'vz',
    equation: '-(1-mu)*z/((x+mu)^2+y^2+z^2)^(3/2)-mu*z/((x-1+mu)^2+y^2+z^2)^(3/2)',
    sections: primaries,
  },
  {
    slug: 'three-body-planar',
    variables: 'x1,y1,x2,y2,x3,y3,u1,v1,u2,v2,u3,v3',
    variable: 'u1',
    equation: '(x2-x1)/((x1-x2)^2+(y1-y2)^2)^(3/2)+(x3-x1)/((x1-x3)^2+(y1-y3)^2)^(3/2)',
    sections: { y1: 'y1-up' },
  },
  {
    slug: 'lotka-volterra',
    variables: 'x,y',
    variable: 'x',
    equation: '2*(x-x*y)',
    sections: { '-(x-1)': 'x-star-down' },
  },
  { slug: 'brusselator', variables: 'x,y', variable: 'x', equation: 'A+x^2*y-(B+1)*x', sections: { 'x-1': 'x-a-up' } },
  { slug: 'fitzhugh-nagumo', variables: 'v,w', variable: 'v', equation: 'v-v^3/3-w+I', sections: { v: 'v-up' } },
  { slug: 'pendulum', variables: 'q,p', variable: 'p', equation: '-sin(q)', sections: { q: 'q-up' } },
  { slug: 'hopf', variables: 'x,y', variable: 'x', equation: 'x-y-x*(x^2+y^2)', sections: primaries },
  {
    slug: 'hopf',
    variables: 'x,y',
    variable: 'x',
    equation: '-y+a*x*(x^2+y^2-1)',
    parameters: ({ a = '' }) => ({ mu: negated(a), a }),
    sections: primaries,
  },
  {
    slug: 'kepler',
    variables: 'x,y,u,v',
    variable: 'u',
    equation: '-x/(x^2+y^2)^(3/2)',
    sections: { y: 'y-up' },
  },
];

/** The section of a case as one formula whose increase counts. */
export function sectionFormula({ section: { expression, direction } }: ReferenceCase): string {
  return direction === 1 ? expression : `-(${expression})`;
}

/** The built-in system of which a case is an instance, with its parameters and, where one fits, the named section. */
export function builtInOf(
  reference: ReferenceCase,
): { slug: string; parameters: Record<string, string>; section: string | null } | null {
  const { variables, parameters, equations } = reference.system;
  const rule = RULES.find((r) => r.variables === variables.join(',') && equations[r.variable] === r.equation);
  if (!rule) return null;
  return {
    slug: rule.slug,
    parameters: rule.parameters ? rule.parameters(parameters) : parameters,
    section: rule.sections[sectionFormula(reference)] ?? null,
  };
}
