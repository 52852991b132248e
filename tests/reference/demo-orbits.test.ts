import type { CheckReport, SubmissionBody } from '@/schemas/generated/contract';
import type { CatalogueOrbit } from '@/server/checks/match-orbits';
import { demoOrbits } from '@/server/demo/demo-orbits';
import { catalogued, checkBody } from '@/tests/reference/check-body';

const catalogue = new Map<string, CatalogueOrbit[]>();

/** Check a body against the demo orbits of its system and parameters before it, then put it beside them. */
function checkNext(body: SubmissionBody, accession: string): CheckReport {
  const family = JSON.stringify([body.system, body.parameters]);
  const entries = catalogue.get(family) ?? [];
  const { report, errors } = checkBody(body, entries);
  if (!report) throw new Error(errors.map(({ message }) => message).join(' '));
  catalogue.set(family, [...entries, catalogued(accession, JSON.stringify(body.section), report)]);
  return report;
}

describe('the demo orbits, checked one after another', () => {
  it.each(demoOrbits.map((body, index) => ({ body, index, name: `${body.system} ${String(body.period)}` })))(
    '$index, $name, closes, agrees with all it claims and is none of those before',
    ({ body, index }) => {
      const report = checkNext(body, String(index));
      expect(report.verdict).toMatch(/^closes/);
      expect(report.findings.filter(({ severity }) => severity === 'blocker')).toEqual([]);
      expect(report.matches.filter(({ relation }) => relation !== 'symmetric-image')).toEqual([]);
      expect(report.orbit?.returns).toBe(body.returns);
    },
  );
});
