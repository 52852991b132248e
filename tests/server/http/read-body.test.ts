import express, { type Express } from 'express';
import request from 'supertest';
import { problemResponses } from '@/server/http/problem-response';
import { MAX_BODY_BYTES, readBody } from '@/server/http/read-body';
import { withRequestId } from '@/server/http/request-id';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { createLog } from '@/server/log';

/** Answers what it read, after the schema of a submission's body or of a draft. */
function echo(schema: string): Express {
  const app = express();
  app.use(withRequestId, readBody());
  app.post('/', validBody(schema), (req, res) => res.json(bodyOf(req)));
  app.use(problemResponses(createLog({ logLevel: 'silent' }, 'test')));
  return app;
}

const drafts = echo('draft-body');
const bodies = echo('submission-body');
const post = (app: Express, text: string): request.Test =>
  request(app).post('/').set('Content-Type', 'application/json').send(text);

const anOrbit = {
  system: 'lorenz',
  section: 'z-27',
  point: ['-13.763610682134', '-19.578751942452', '27'],
  period: '1.5586522107161747',
};

describe('reading a body', () => {
  it('passes a valid body on as it is', async () => {
    const res = await post(bodies, JSON.stringify(anOrbit));
    expect(res.status).toBe(200);
    expect(res.body).toEqual(anOrbit);
  });

  it('keeps the digits of numbers that a double would lose', async () => {
    const res = await post(
      bodies,
      '{"system":"lorenz","section":"z-27","point":[27.0,-13.763610682134123456789,27],"period":1.50,"returns":2.0,"parameters":{"rho":28.10}}',
    );
    expect(res.body.point).toEqual(['27.0', '-13.763610682134123456789', 27]);
    expect(res.body.period).toBe('1.50');
    expect(res.body.returns).toBe(2);
    expect(res.body.parameters).toEqual({ rho: '28.10' });
  });

  it.each([
    ['{"a":x}', 6, 'unexpected "x"'],
    ['{"a": 1,}', 9, 'unexpected "}"'],
    ['{"a": 01}', 8, 'unexpected "1"'],
    ['{"a": NaN}', 7, 'unexpected "N"'],
    ['[1, 2', 6, 'ends too early'],
    ['{"a": "b', 7, 'unexpected'],
    ['{} {}', 4, 'unexpected "{"'],
  ])('says where %s stops being JSON', async (text, position, reason) => {
    const res = await post(drafts, text);
    expect(res.status).toBe(400);
    expect(res.type).toBe('application/problem+json');
    expect(res.body.code).toBe('malformed-json');
    expect(res.body.errors[0].position).toBe(position);
    expect(res.body.detail).toContain(reason);
  });

  it('counts lines and columns', async () => {
    const res = await post(drafts, '{\n  "a": 1\n  "b": 2\n}');
    expect(res.body.detail).toContain('line 3, column 3');
  });

  it('refuses bytes that are not UTF-8', async () => {
    const res = await request(drafts)
      .post('/')
      .set('Content-Type', 'application/json')
      .serialize(() => Buffer.from([0x22, 0xff, 0x22]) as unknown as string)
      .send({});
    expect(res.body.code).toBe('malformed-json');
  });

  it.each(['text/plain', 'application/xml', 'application/json; charset=latin1', 'multipart/form-data'])(
    'refuses the content type %s',
    async (type) => {
      const res = await request(bodies).post('/').set('Content-Type', type).send(JSON.stringify(anOrbit));
      expect(res.status).toBe(415);
      expect(res.body.detail).toContain('application/json');
    },
  );

  it('reads a body of 10 MB to its end and names the limit', async () => {
    const res = await post(drafts, JSON.stringify({ note: 'x'.repeat(10_000_000) }));
    expect(res.status).toBe(413);
    expect(res.body.code).toBe('body-too-large');
    expect(res.body.detail).toContain(String(MAX_BODY_BYTES));
  });

  it('takes a body of exactly the limit', async () => {
    const frame = '{"note":""}'.length;
    const res = await post(drafts, JSON.stringify({ note: 'x'.repeat(MAX_BODY_BYTES - frame) }));
    expect(res.status).toBe(200);
  });

  it.each([
    ['deep lists', `{"a":${'['.repeat(100_000)}${']'.repeat(100_000)}}`, 'nested deeper than 32 levels'],
    ['deep objects', `{"a":${'{"a":'.repeat(50_000)}1${'}'.repeat(50_000)}}`, 'nested deeper than 32 levels'],
    ['a member called __proto__', '{"parameters":{"__proto__":{"send":true}}}', 'no member may have'],
    ['the character U+0000', '{"note":"a\\u0000b"}', 'U+0000'],
    ['half a surrogate pair', '{"note":"\\ud800"}', 'surrogate'],
    ['a number beyond doubles', '{"returns":1e400}', 'too large'],
  ])('refuses %s', async (_, text, reason) => {
    const res = await post(drafts, text);
    expect(res.status).toBe(400);
    expect(res.body.code).toBe('invalid-body');
    expect(res.body.errors).toHaveLength(1);
    expect(res.body.detail).toContain(reason);
    expect(({} as Record<string, unknown>)['send']).toBeUndefined();
  });

  it('says that the body is missing', async () => {
    const res = await request(bodies).post('/');
    expect(res.status).toBe(400);
    expect(res.body.code).toBe('empty-body');
  });

  it('lets a body be missing where nothing is needed', async () => {
    const res = await request(drafts).post('/');
    expect(res.status).toBe(200);
    expect(res.body).toEqual({});
  });

  it('answers with the request id of its header', async () => {
    const res = await post(drafts, '{');
    expect(res.body.instance).toBe(res.headers['x-request-id']);
    expect(res.body.instance).toMatch(/^[0-9a-f-]{36}$/);
  });
});

describe('validating a body', () => {
  const { period: _period, ...withoutPeriod } = anOrbit;

  it.each<[string, Record<string, unknown>, string, string]>([
    ['a member that is missing', withoutPeriod, '/period', 'period is missing.'],
    [
      'an unknown member',
      { ...anOrbit, perod: '1' },
      '/perod',
      'perod is not known here; known are system, parameters',
    ],
    ['a list that should be text', { ...anOrbit, note: [] }, '/note', 'note must be text, not a list.'],
    ['an empty coordinate', { ...anOrbit, point: ['1', '', '2'] }, '/point/1', 'point, item 2 is not a number'],
    ['a coordinate that is not a number', { ...anOrbit, point: ['1', '2', 'NaN'] }, '/point/2', '(typed: "NaN")'],
    ['an infinity', { ...anOrbit, period: 'Infinity' }, '/period', 'period is not a number'],
    ['null', { ...anOrbit, period: null }, '/period', 'period must be text or a number, not null.'],
    [
      '5,000 digits',
      { ...anOrbit, period: '1'.repeat(5000) },
      '/period',
      'has 5000 characters; at most 200 are allowed',
    ],
    ['no coordinates', { ...anOrbit, point: [] }, '/point', 'has 0 items; at least 1 are needed'],
    ['17 coordinates', { ...anOrbit, point: Array(17).fill('1') }, '/point', 'has 17 items; at most 16 are allowed'],
    ['returns 0', { ...anOrbit, returns: 0 }, '/returns', 'returns is 0; the smallest allowed is 1.'],
    ['returns 10,000', { ...anOrbit, returns: 10000 }, '/returns', 'the largest allowed is 5000.'],
    ['half a return', { ...anOrbit, returns: 1.5 }, '/returns', 'must be a whole number'],
    ['a section of no known form', { ...anOrbit, section: { level: 'z' } }, '/section/level', 'is not known here'],
    ['a section that is a number', { ...anOrbit, section: 27 }, '/section', 'must be text or an object, not a number.'],
    ['half a plane', { ...anOrbit, section: { plane: { normal: ['1'] } } }, '/section/plane/through', 'is missing'],
    [
      'a formula that is no text',
      { ...anOrbit, section: { formula: 3 } },
      '/section/formula',
      'must be text, not a number',
    ],
    [
      'a parameter that is a list',
      { ...anOrbit, parameters: { rho: [] } },
      '/parameters/rho',
      'must be text or a number',
    ],
    [
      'a list as the whole body',
      [] as unknown as Record<string, unknown>,
      '',
      'The body must be an object, not a list.',
    ],
  ])('names %s', async (_, body, pointer, sentence) => {
    const res = await post(bodies, JSON.stringify(body));
    expect(res.status).toBe(400);
    expect(res.body.code).toBe('invalid-body');
    const found = res.body.errors.filter((error: { pointer: string }) => error.pointer === pointer);
    expect(found).toHaveLength(1);
    expect(found[0].message).toContain(sentence);
  });

  it('names each wrong field once', async () => {
    const res = await post(
      bodies,
      JSON.stringify({ section: 'z-27', point: ['x', null, '1'], period: '', returns: '2' }),
    );
    expect(res.body.errors.map((error: { pointer: string }) => error.pointer).sort()).toEqual([
      '/period',
      '/point/0',
      '/point/1',
      '/returns',
      '/system',
    ]);
  });

  it('escapes slashes of member names in pointers', async () => {
    const res = await post(bodies, JSON.stringify({ ...anOrbit, 'a/b~c': 1 }));
    expect(res.body.errors[0].pointer).toBe('/a~1b~0c');
  });
});
