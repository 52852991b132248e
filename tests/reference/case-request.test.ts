import { validatorOf } from '@/server/schema-registry';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { builtInOf, sectionFormula } from '@/tests/reference/built-in-of';
import { caseDocument } from '@/tests/reference/case-document';
import { caseRequest } from '@/tests/reference/case-request';
import { loadCases } from '@/tests/reference/load-cases';
import { randomStates } from '@/tests/systems/random-states';
import { StatedSystem } from '@/tests/systems/stated-system';

const STATES = 6;
const cases = loadCases();
const instances = cases.flatMap((reference) => {
  const builtIn = builtInOf(reference);
  return builtIn ? [{ id: reference.id, reference, builtIn }] : [];
});
const documentOf = (slug: string) => builtInSystems.find((system) => system.slug === slug)!;
/** What cannot be stated at all: numbers that are none, a number of coordinates that no schema knows. */
const MALFORMED = new Set(['bad-number', 'bad-system', 'bad-point']);

describe('a case that is an instance of a built-in system', () => {
  it('covers every built-in system save the forced one, whose phase the case carries as two variables', () => {
    const covered = new Set(instances.map(({ builtIn }) => builtIn.slug));
    expect(builtInSystems.map(({ slug }) => slug).filter((slug) => !covered.has(slug))).toEqual(['duffing']);
  });

  it.each(instances)('$id has the same variables and right-hand sides', ({ reference, builtIn }) => {
    const own = new StatedSystem(caseDocument(reference));
    const system = new StatedSystem(documentOf(builtIn.slug), builtIn.parameters);
    expect(system.document.variables.map(({ name }) => name)).toEqual(reference.system.variables);
    for (const x of randomStates(reference.system.variables.length, STATES)) {
      const expected = own.field(x);
      system.field(x).forEach((value, i) => expect(value).toBeCloseTo(expected[i]!, 10));
    }
  });

  it.each(instances.filter(({ builtIn }) => builtIn.section !== null))(
    '$id means the same surface and direction by the named section',
    ({ reference, builtIn }) => {
      const own = new StatedSystem(caseDocument(reference));
      const system = new StatedSystem(documentOf(builtIn.slug), builtIn.parameters);
      const { formula } = system.document.sections!.find(({ name }) => name === builtIn.section)!;
      for (const x of randomStates(reference.system.variables.length, STATES)) {
        expect(system.at(formula, x)).toBeCloseTo(own.at(sectionFormula(reference), x), 12);
      }
    },
  );

  it.each(instances.filter(({ reference }) => reference.kind === 'orbit' && reference.invariants))(
    '$id has the invariants of its system',
    ({ reference, builtIn }) => {
      const system = new StatedSystem(documentOf(builtIn.slug), builtIn.parameters);
      const x = caseRequest(reference).exact.point.map(Number);
      const values = system.document.invariants!.map(({ formula }) => system.at(formula, x));
      const { jacobi, energy, first_integral, angular_momentum } = reference.invariants!;
      for (const published of [jacobi, energy, first_integral, angular_momentum]) {
        if (!published) continue;
        const nearest = Math.min(...values.map((value) => Math.abs(value - Number(published.value))));
        expect(nearest).toBeLessThan(1e-12 * Math.max(1, Math.abs(Number(published.value))));
      }
    },
  );
});

describe('the forced Duffing oscillator', () => {
  it('has the field of the case whose forcing phase is a point on a circle', () => {
    const reference = cases.find(({ id }) => id === 'exact-duffing-subharmonic')!;
    const own = new StatedSystem(caseDocument(reference));
    const system = new StatedSystem(documentOf('duffing'));
    for (const [x = 0, v = 0, theta = 0] of randomStates(3, STATES)) {
      const [dx, dv, dc] = own.field([x, v, Math.cos(theta), Math.sin(theta)]);
      const [ex = 0, ev = 0, omega = 0] = system.field([x, v, theta]);
      expect(ex).toBeCloseTo(dx!, 12);
      expect(ev).toBeCloseTo(dv!, 12);
      expect(-Math.sin(theta) * omega).toBeCloseTo(dc!, 12);
    }
  });
});

describe('caseRequest', () => {
  it.each(cases.filter(({ expect: { reason } }) => !MALFORMED.has(reason)))(
    'states $id as a valid body',
    (reference) => {
      const validate = validatorOf('check-request');
      for (const inline of [false, true]) {
        const { body, slug } = caseRequest(reference, { inline });
        expect(validate(body) ? [] : validate.errors).toEqual([]);
        expect(typeof body.system).toBe(slug === null ? 'object' : 'string');
      }
    },
  );

  it('keeps all digits beside the seventeen that are sent', () => {
    const { body, exact } = caseRequest(cases.find(({ id }) => id === 'lorenz-AB')!);
    expect(body.period).toBe('1.5586522107161747');
    expect(exact.period).toBe('1.55865221071617472756787020921269607052848');
  });

  it('leaves the trivial multiplier out of what is claimed', () => {
    const { body } = caseRequest(cases.find(({ id }) => id === 'wrong-multiplier-sign')!);
    expect(body.multipliers).toEqual(['1.874456087585', '0.151835']);
  });
});
