import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { soundSystem } from '@/tests/reference/check-body';
import { readDatasetLine } from '@/tests/reference/dataset-line';
import { measureOrbit } from '@/tests/reference/measure-orbit';

const system = soundSystem(builtInSystems.find(({ slug }) => slug === 'lorenz')!);
const orbits = readFileSync(join(__dirname, 'lorenz-20-every-100th.ndjson'), 'utf8')
  .trimEnd()
  .split('\n')
  .map((line) => readDatasetLine(line)!);
const lengths = [...new Set(orbits.map(({ label }) => label.length))];

describe('every hundredth Lorenz orbit of up to 20 returns', () => {
  it('is one of 1,111', () => {
    expect(orbits).toHaveLength(1111);
  });

  it.each(lengths)('has period, multiplier, returns and itinerary with %d letters', (length) => {
    const wrong = orbits
      .filter(({ label }) => label.length === length)
      .map((orbit) => measureOrbit(system, orbit))
      .filter(({ faults }) => faults.length > 0);
    expect(wrong).toEqual([]);
  });
});

describe('measuring an orbit against a data set', () => {
  const AB = orbits.find(({ label }) => label === 'AB')!;

  it.each([
    ['a period in its thirteenth digit', { body: { ...AB.body, period: '1.5586522107162' } }, /period off/],
    ['a multiplier in its eighth digit', { logMultiplier: 1.55031348 }, /multiplier off/],
    ['an itinerary', { body: { ...AB.body, itinerary: 'AA' } }, /itinerary AB/],
    ['the number of returns', { body: { ...AB.body, returns: 3 } }, /2 returns, not 3/],
    ['the orbit', { body: { ...AB.body, period: '1.7' } }, /does-not-close/],
  ])('sees that it has %s wrong', (_, change, fault) => {
    expect(measureOrbit(system, { ...AB, ...change }).faults.join('; ')).toMatch(fault);
  });
});

describe('a line of a data set', () => {
  it('may be one of the tables, one of an export, or the end of an export', () => {
    const exported = {
      accession: 'RTN-0000001X',
      submitted: { system: 'lorenz', period: '1.5' },
      multipliers: [{ re: '-3', im: '4' }],
    };
    expect(readDatasetLine(JSON.stringify(exported))).toMatchObject({
      label: 'RTN-0000001X',
      body: { period: '1.5' },
      logMultiplier: Math.log(5),
    });
    expect(readDatasetLine('{"code":"01","n":2,"period":1.50,"point":[1,-2.0]}')).toMatchObject({
      body: { system: 'rossler', point: ['1', '0', '-2.0'], period: '1.50', returns: 2 },
    });
    expect(readDatasetLine('{"end":true,"count":1,"sha256":""}')).toBeNull();
  });

  it.each(['{"x":1}', '{"code":"AB","n":2,"period":1}', 'AB'])('is refused when it is %s', (line) => {
    expect(() => readDatasetLine(line)).toThrow(SyntaxError);
  });
});
