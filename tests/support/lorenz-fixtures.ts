import type { Entry, OrbitPage, System, Trace } from '@/schemas/generated/contract';

const CAUTION =
  'A numerical result of an idealised model. Nothing here is cleared for the operation of a vehicle, machine or plant; follow local codes and licensed practice.';

/** The Lorenz system as the API shows it. */
export const lorenzSystem: System = {
  slug: 'lorenz',
  version: 1,
  name: 'Lorenz',
  summary: 'Three modes of a fluid layer heated from below.',
  acceptedAt: '2026-03-02T10:00:00.000Z',
  dimension: 3,
  document: {
    name: 'Lorenz',
    variables: [{ name: 'x' }, { name: 'y' }, { name: 'z' }],
    parameters: [
      { name: 'sigma', value: '10' },
      { name: 'rho', value: '28' },
      { name: 'beta', value: '8/3' },
    ],
    equations: { x: 'sigma*(y - x)', y: 'rho*x - y - x*z', z: 'x*y - beta*z' },
    symmetries: [{ name: 'half-turn', map: { x: '-x', y: '-y', z: 'z' }, reversesTime: false }],
  },
  mathml:
    '<math xmlns="http://www.w3.org/1998/Math/MathML" display="block"><mrow><mi>ẋ</mi><mo>=</mo><mi>σ</mi></mrow></math>',
  text: "x' = sigma*(y - x)\ny' = rho*x - y - x*z\nz' = x*y - beta*z",
  divergence: '-sigma - 1 - beta',
  sections: [
    {
      name: 'z-27',
      formula: 'z - 27',
      description: null,
      mathml: '<math xmlns="http://www.w3.org/1998/Math/MathML"><mi>z</mi></math>',
      letters: [
        { letter: 'A', where: '-x' },
        { letter: 'B', where: 'x' },
      ],
      incipit: { coordinate: 'x', levels: [16, 8, 0, -8, -16] },
      entries: 3,
    },
  ],
  entries: 3,
  shortest: 'RTN-0000001X',
  knownByReturns: [
    {
      section: 'z-27',
      parameters: { sigma: '10', rho: '28', beta: '8/3' },
      known: 3,
      rows: [
        { returns: 2, known: 1, allowed: 1 },
        { returns: 3, known: 2, allowed: 2 },
        { returns: 4, known: 0, allowed: 3 },
      ],
      source: 'Binary necklaces',
    },
  ],
  links: { self: '/api/v1/systems/lorenz', page: '/systems/lorenz', orbits: '/api/v1/orbits?system=lorenz' },
};

/** A second system, without entries. */
export const rosslerSystem: System = {
  ...lorenzSystem,
  slug: 'rossler',
  name: 'Rössler',
  summary: 'One band that folds over itself.',
  entries: 0,
  shortest: null,
  sections: [],
  knownByReturns: [],
  links: { self: '/api/v1/systems/rossler', page: '/systems/rossler', orbits: '/api/v1/orbits?system=rossler' },
};

/** The shortest orbit of the Lorenz system, itinerary AB. */
export const entryAB: Entry = {
  accession: 'RTN-0000001X',
  revision: 1,
  status: 'accepted',
  system: { slug: 'lorenz', version: 1, name: 'Lorenz' },
  parameters: { sigma: '10', rho: '28', beta: '8/3' },
  section: { name: 'z-27', formula: 'z - 27' },
  point: ['-13.763610682134201', '-19.578751942451796', '27'],
  returns: 2,
  period: '1.5586522107161747',
  returnTimes: ['0.77932610535808736', '0.77932610535808736'],
  crossings: [
    { time: '0.77932610535808736', point: ['13.763610682134201', '19.578751942451796', '27'], transversality: 0.9412 },
    { time: '1.5586522107161747', point: ['-13.763610682134201', '-19.578751942451796', '27'], transversality: 0.9412 },
  ],
  itinerary: 'AB',
  multipliers: [
    { re: '4.7129', im: '0' },
    { re: '1.19e-10', im: '0' },
  ],
  unitMultipliers: 1,
  exponents: [0.994, -14.66],
  stability: 'saddle',
  unstableDirections: 1,
  smallestTransversality: 0.9412,
  extent: [
    [-15.9, 15.9],
    [-20.4, 20.4],
    [11.2, 35.3],
  ],
  invariants: [],
  closure: { absolute: 3.1e-12, relative: 7.4e-14, tolerance: 1e-9 },
  correction: {
    iterations: 2,
    shift: 1.2e-13,
    periodShift: 0,
    residual: 4e-15,
    segments: 2,
    held: 'z',
    freeDirections: 0,
    basinRatio: null,
  },
  verdict: 'closes',
  findings: [],
  evidence: { level: 're-integrated', digits: 15, engine: '1.0.0', held: null, obstacle: null },
  submitted: {
    system: 'lorenz',
    section: 'z-27',
    point: ['-13.763610682134201', '-19.578751942451796', '27'],
    returns: 2,
    period: '1.5586522107161747',
  },
  contributor: { name: 'Ida Marten', orcid: null },
  curator: { name: 'Paul Weidner', orcid: null },
  submittedAt: '2026-03-14T09:00:00.000Z',
  acceptedAt: '2026-03-16T10:00:00.000Z',
  references: [],
  note: null,
  licence: 'CC-BY-4.0',
  withdrawal: null,
  caution: CAUTION,
  links: {
    self: '/api/v1/orbits/RTN-0000001X',
    page: '/orbits/RTN-0000001X',
    trace: '/api/v1/orbits/RTN-0000001X/trace',
    system: '/api/v1/systems/lorenz',
  },
};

/** A second entry: the figures of the first under another accession and period, for lists. */
export const entryAAB: Entry = {
  ...entryAB,
  accession: 'RTN-00000028',
  returns: 3,
  period: '2.3059072639398477',
  itinerary: 'AAB',
  returnTimes: ['0.76690384493383071', '0.85287329050672378', '0.68613012849929326'],
  crossings: [
    {
      time: '0.76690384493383071',
      point: ['-13.506619833568091', '-18.991899080205334', '27'],
      transversality: 0.9501,
    },
    { time: '1.6197771354405545', point: ['14.426408025034635', '21.111230056993897', '27'], transversality: 0.9601 },
    { time: '2.3059072639398477', point: ['-12.595115397688723', '-16.970525307084343', '27'], transversality: 0.9412 },
  ],
};

export const pageOf = (...items: Entry[]): OrbitPage => ({
  items,
  next: null,
  total: { value: items.length, relation: 'exact' },
  upToSymmetry: null,
  incipits: Object.fromEntries(
    items.map(({ accession }) => [
      accession,
      [
        [0, -13.7],
        [0.8, 13.7],
        [1.5, -13.7],
      ],
    ]),
  ),
  distances: null,
});

/** A coarse polyline of the first entry. */
export const traceAB: Trace = {
  variables: ['x', 'y', 'z'],
  times: [0, 0.4, 0.779326, 1.2, 1.558652],
  points: [
    [-13.76, -19.58, 27],
    [-2, -2, 15],
    [13.76, 19.58, 27],
    [2, 2, 15],
    [-13.76, -19.58, 27],
  ],
  crossings: [
    { time: 0.779326, point: [13.76, 19.58, 27] },
    { time: 1.558652, point: [-13.76, -19.58, 27] },
  ],
  closes: true,
};
