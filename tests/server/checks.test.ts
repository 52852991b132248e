import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import request from 'supertest';
import type { CheckRequest } from '@/schemas/generated/contract';
import { OrbitCheck } from '@/server/models/orbit-check';
import { CHECKS_AT_ONCE } from '@/server/services/check-limits';
import { formErrors } from '@/server/http/form-errors';
import { type JobRunner, startJobs } from '../support/job-runner';
import { lorenzOrbit, pendulumDocument, slowOrbit } from '../support/orbits';
import { anAccount, signedIn, testApp, type TestApp } from '../support/test-app';

let t: TestApp;
let jobs: JobRunner;
let member: ReturnType<typeof request.agent>;
beforeAll(async () => {
  t = await testApp();
  jobs = await startJobs(t);
  member = await signedIn(t.app, await anAccount('contributor'));
});
afterAll(async () => {
  await jobs.stop();
  await t.close();
});

const check = (body: object, wait = 50): request.Test =>
  member.post('/api/v1/checks').set('Prefer', `wait=${wait}`).send(body);

describe('POST /checks', () => {
  it('integrates an orbit again and answers the whole report', async () => {
    const res = await check(lorenzOrbit('AB'));
    expect(res.status).toBe(200);
    expect(formErrors('check', res.body)).toEqual([]);
    expect(res.headers['preference-applied']).toBe('wait=50');
    expect(res.headers['location']).toBe(`/api/v1/checks/${res.body.id}`);
    expect(res.body.checkState).toBe('done');
    expect(res.body.verdict).toBe('closes');
    expect(res.body.orbit).toMatchObject({ returns: 2, prime: true, stability: 'saddle', itinerary: 'AB' });
    // D. Viswanath, Nonlinearity 16 (2003): T = 1.5586522107161747; the multiplier is exp(1.55031346040268…).
    expect(Number(res.body.orbit.period)).toBeCloseTo(1.5586522107161747, 13);
    expect(Math.log(Number(res.body.orbit.multipliers[0].re))).toBeCloseTo(1.5503134604026889, 9);
    expect(res.body.body).toEqual(lorenzOrbit('AB'));

    const again = await request(t.app).get(`/api/v1/checks/${res.body.id}`);
    expect(again.body).toEqual(res.body);
  });

  it('checks an orbit of a system that comes inline', async () => {
    const body: CheckRequest = {
      system: pendulumDocument,
      section: { formula: 'x' },
      point: ['0', '1'],
      period: '6.7430014192503842',
      returns: 1,
    };
    const res = await check(body);
    // Swing through the lowest point at speed 1: 4 K(m = 1/4) = 6.743001419250384…, NIST DLMF 19.
    expect(res.body.verdict).toBe('closes');
    expect(Number(res.body.orbit.period)).toBeCloseTo(6.743001419250384, 12);
    expect(res.body.orbit.itinerary).toBeNull();
  });

  it('answers 202 at once when nobody wants to wait, and finds the report later', async () => {
    const res = await member.post('/api/v1/checks').send(lorenzOrbit('AAB'));
    expect(res.status).toBe(202);
    expect(res.body.verdict).toBeNull();
    expect(res.headers['preference-applied']).toBeUndefined();
    let found = res;
    for (let i = 0; i < 200 && found.body.checkState !== 'done'; i += 1) {
      await new Promise((resolve) => setTimeout(resolve, 100));
      found = await request(t.app).get(`/api/v1/checks/${res.body.id}`);
    }
    expect(found.body.verdict).toBe('closes');
  });

  it('repeats the first answer under an Idempotency-Key and checks nothing again', async () => {
    const post = (): request.Test => check(lorenzOrbit('ABB')).set('Idempotency-Key', 'one-check');
    const first = await post();
    const before = await OrbitCheck.count();
    const second = await post();
    expect(second.body).toEqual(first.body);
    expect(await OrbitCheck.count()).toBe(before);
  });

  it.each<[string, object, string]>([
    ['a period that is no multiple', { period: '1.9' }, 'does-not-close'],
    ['an escape', { point: ['1e99', '0', '27'] }, 'does-not-close'],
  ])('answers %s with a verdict', async (_, change, verdict) => {
    const res = await check({ ...lorenzOrbit('AB'), returnTimes: undefined, itinerary: undefined, ...change });
    expect([res.status, res.body.verdict]).toEqual([200, verdict]);
  });

  it.each<[string, object, string]>([
    ['a point off the section', { point: ['-13.7', '-19.5', '30.5'] }, 'point-off-section'],
    ['a section that the flow crosses the other way', { section: { formula: '27 - z' } }, 'wrong-crossing-direction'],
    ['a section that the flow never meets', { section: { formula: 'z - 27 + 0*x' }, period: '0.01' }, 'no-return'],
    ['an equilibrium', { section: { formula: 'x' }, point: ['0', '0', '0'] }, 'equilibrium'],
    ['twice the period', { period: '3.1173044214323494', returns: 4 }, 'period-is-multiple'],
  ])('finds %s', async (_, change, code) => {
    const { system, section, point, period } = lorenzOrbit('AB');
    const res = await check({ system, section, point, period, ...change });
    expect(res.status).toBe(200);
    expect(res.body.findings.map((finding: { code: string }) => finding.code)).toContain(code);
  });
});

/** Status, code, and the pointer of a field. */
type Refusal = [status: number, code: string, pointer: string];

describe('a body that is wrong', () => {
  const digits = '1'.repeat(5000);
  const inline = (change: object): object => ({
    ...lorenzOrbit(),
    system: { ...pendulumDocument, ...change },
    section: { formula: 'x' },
    point: ['0', '1'],
  });

  it.each<[string, object, Refusal]>([
    ['a system nobody defined', { system: 'nowhere' }, [422, 'unknown-system', '/system']],
    ['a section that the system lacks', { section: 'y-7' }, [422, 'invalid-content', '/section']],
    ['an unknown name in a section', { section: { formula: 'z - w' } }, [422, 'invalid-content', '/section/formula']],
    ['a formula that ends too early', { section: { formula: 'z -' } }, [422, 'invalid-content', '/section/formula']],
    ['a function that is not smooth', { section: { formula: 'abs(z)' } }, [422, 'invalid-content', '/section/formula']],
    ['a coordinate too few', { point: ['1', '2'] }, [422, 'invalid-content', '/point']],
    ['NaN', { point: ['NaN', '2', '27'] }, [400, 'invalid-body', '/point/0']],
    ['an infinity', { point: ['Infinity', '2', '27'] }, [400, 'invalid-body', '/point/0']],
    ['an empty string', { point: ['', '2', '27'] }, [400, 'invalid-body', '/point/0']],
    ['a number of 5,000 digits', { point: [digits, '2', '27'] }, [400, 'invalid-body', '/point/0']],
    ['1e400', { point: ['1e400', '2', '27'] }, [422, 'invalid-content', '/point/0']],
    ['a negative period', { period: '-1.5' }, [422, 'invalid-content', '/period']],
    ['a period of zero', { period: '0' }, [422, 'invalid-content', '/period']],
    ['no returns', { returns: 0 }, [400, 'invalid-body', '/returns']],
    ['10,000 returns', { returns: 10_000 }, [400, 'invalid-body', '/returns']],
    ['an unknown member', { colour: 'red' }, [400, 'invalid-body', '/colour']],
    ['an unknown parameter', { parameters: { gamma: '1' } }, [422, 'invalid-content', '/parameters/gamma']],
    ['a tolerance out of range', { tolerance: '1' }, [422, 'invalid-content', '/tolerance']],
    ['more than a hundred digits', { digits: 101 }, [400, 'invalid-body', '/digits']],
    ['fewer than fifteen digits', { digits: 14 }, [400, 'invalid-body', '/digits']],
  ])('%s is refused and nothing is stored', async (_, change, [status, code, pointer]) => {
    const before = await OrbitCheck.count();
    const res = await check({ ...lorenzOrbit(), ...change });
    expect([res.status, res.body.code]).toEqual([status, code]);
    expect(res.body.errors.map((error: { pointer: string }) => error.pointer)).toContain(pointer);
    expect(await OrbitCheck.count()).toBe(before);
  });

  it.each<[string, object, string]>([
    ['an equation left out', { equations: { x: 'v' } }, '/system/equations'],
    ['an unknown name', { equations: { x: 'v', v: '-sin(y)' } }, '/system/equations/v'],
    ['a conditional function', { equations: { x: 'v', v: 'min(x, 1)' } }, '/system/equations/v'],
  ])('%s in a system inline is refused with its place', async (_, change, pointer) => {
    const res = await check(inline(change));
    expect([res.status, res.body.code]).toEqual([422, 'invalid-content']);
    expect(res.body.errors[0].pointer).toBe(pointer);
  });

  it('shows the character at which a formula goes wrong', async () => {
    const res = await check(inline({ equations: { x: 'v', v: '-sin(x' } }));
    expect(res.body.errors[0]).toMatchObject({ pointer: '/system/equations/v', position: 7 });
  });

  it.each<[string, string, string, [status: number, code: string]]>([
    ['malformed JSON', '{"system": "lorenz",', 'application/json', [400, 'malformed-json']],
    ['a wrong content type', 'system=lorenz', 'application/x-www-form-urlencoded', [415, 'unsupported-media-type']],
    ['a body of 10 MB', `{"note": "${'x'.repeat(10_000_000)}"}`, 'application/json', [413, 'body-too-large']],
  ])('%s is refused and nothing is stored', async (_, body, type, [status, code]) => {
    const before = await OrbitCheck.count();
    const res = await request(t.app).post('/api/v1/checks').set('Content-Type', type).send(body);
    expect([res.status, res.body.code]).toEqual([status, code]);
    expect(await OrbitCheck.count()).toBe(before);
  });
});

describe('who may compute', () => {
  it('gives visitors no digits', async () => {
    const res = await request(t.app)
      .post('/api/v1/checks')
      .send({ ...lorenzOrbit(), digits: 16 });
    expect([res.status, res.body.errors[0].pointer]).toEqual([422, '/digits']);
  });

  it('lets an account have 8 checks at once and no more', async () => {
    const agent = await signedIn(t.app, await anAccount());
    const answers = [];
    for (let i = 0; i <= CHECKS_AT_ONCE; i += 1) {
      answers.push(await agent.post('/api/v1/checks').send(slowOrbit({ period: '100' })));
    }
    expect(answers.map(({ status }) => status)).toEqual([...Array<number>(CHECKS_AT_ONCE).fill(202), 429]);
    const refused = answers.at(-1)!;
    expect(refused.body.code).toBe('too-many-checks');
    expect(refused.body.detail).toContain('8 at once');
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
    // Nobody waits for them: the next tests need the threads.
    await OrbitCheck.update(
      { state: 'failed', failure: 'ended by the test', finishedAt: new Date() },
      { where: { state: 'queued' } },
    );
  });

  it('ends a visitor’s check after 5 s, says so, and counts the time', async () => {
    const post = (): request.Test => request(t.app).post('/api/v1/checks').set('Prefer', 'wait=60').send(slowOrbit());
    const res = await post();
    expect(res.body.checkState).toBe('done');
    expect(res.body.verdict).toBe('inconclusive');
    expect(res.body.findings).toMatchObject([{ code: 'too-long', severity: 'blocker' }]);
    expect(res.body.engine.cpuMs).toBeGreaterThan(4_500);
    expect(res.body.engine.cpuMs).toBeLessThan(10_000);
    // A check computes 4.5 s at least, so three use up the 10 s; two do when nothing else keeps the machine busy.
    let refused = await post();
    for (let more = 0; more < 2 && refused.status !== 429; more += 1) refused = await post();
    expect([refused.status, refused.body.code]).toEqual([429, 'computing-time-used']);
    expect(Number(refused.headers['retry-after'])).toBeLessThanOrEqual(60);
  });
});

describe('GET /checks/:id', () => {
  it.each(['abc', 'AAAAAAAAAAAAAAAAAAAAAA', '..%2f'])('knows no %s', async (id) => {
    const res = await request(t.app).get(`/api/v1/checks/${id}`);
    expect([res.status, res.body.code]).toEqual([404, 'not-found']);
  });

  it('draws what was found, with as many points as asked for', async () => {
    const { body } = await check(lorenzOrbit('AABB'));
    const res = await request(t.app).get(`/api/v1/checks/${body.id}/trace?points=300`);
    expect(formErrors('trace', res.body)).toEqual([]);
    expect(res.body.points).toHaveLength(300);
    expect(res.body.closes).toBe(true);
    expect(res.body.variables).toEqual(['x', 'y', 'z']);
    expect(res.body.crossings).toHaveLength(4);
    for (const points of ['1', '5001', 'many']) {
      expect((await request(t.app).get(`/api/v1/checks/${body.id}/trace?points=${points}`)).status).toBe(400);
    }
  });
});

describe('GET /checks/:id/events', () => {
  let server: Server;
  let base: string;
  beforeAll(async () => {
    server = createServer(t.app);
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    base = `http://127.0.0.1:${(server.address() as AddressInfo).port}`;
  });
  afterAll(() => {
    server.closeAllConnections();
    return new Promise((resolve) => server.close(resolve));
  });

  it('tells the progress and the end', async () => {
    const { body } = await check(slowOrbit({ period: '200' }), 0);
    const stream = await fetch(`${base}/api/v1/checks/${body.id}/events`);
    expect(stream.headers.get('content-type')).toContain('text/event-stream');
    const text = await stream.text();
    const events = text
      .split('\n\n')
      .filter((event) => event.startsWith('event:'))
      .map((event) => ({ name: /event: (.*)/.exec(event)![1], data: JSON.parse(/data: (.*)/.exec(event)![1]!) }));
    expect(events.at(-1)).toEqual({ name: 'done', data: { checkState: 'done', progress: null } });
    const running = events.filter(({ data }) => data.progress !== null);
    expect(running.length).toBeGreaterThan(0);
    expect(['integrating', 'correcting', 'multipliers']).toContain(running[0]!.data.progress.phase);
    expect(running[0]!.data.progress.period).toBe(200);
  });

  it('opens at most four streams a client', async () => {
    const { body } = await check(slowOrbit({ period: '300' }), 0);
    const ends = new AbortController();
    const open = (): Promise<Response> => fetch(`${base}/api/v1/checks/${body.id}/events`, { signal: ends.signal });
    const streams = await Promise.all([open(), open(), open(), open()]);
    expect(streams.map(({ status }) => status)).toEqual([200, 200, 200, 200]);
    const refused = await open();
    expect(refused.status).toBe(429);
    ends.abort();
  });
});
