import type { Router } from 'express';
import request from 'supertest';
import { apiRoutes } from '@/server/api-routes';
import { operations } from '@/server/openapi/operations';
import { schemaDocuments, validatorOf } from '@/server/schema-registry';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
beforeAll(async () => void (t = await testApp()));
afterAll(() => t.close());

interface Layer {
  route?: { path: string; methods: Record<string, boolean> };
  handle?: { stack?: Layer[] };
}

/** "get /orbits" for every route of a router and of the routers in it. */
const mounted = (layers: Layer[]): string[] =>
  layers.flatMap(({ route, handle }) =>
    route ? Object.keys(route.methods).map((method) => `${method} ${route.path}`) : mounted(handle?.stack ?? []),
  );

describe('the API', () => {
  it('mounts every call that is described, and describes every call that is mounted', () => {
    const routes = mounted((apiRoutes(t.dependencies) as Router & { stack: Layer[] }).stack);
    expect([...new Set(routes)].sort()).toEqual(operations.map(({ method, path }) => `${method} ${path}`).sort());
  });

  it('serves its description', async () => {
    const res = await request(t.app).get('/api/v1/openapi.json');
    expect(res.status).toBe(200);
    expect(res.body.openapi).toBe('3.1.0');
  });

  it.each(['/api/v1/nothing', '/api/v2/orbits', '/api', '/api/v1/orbits.xml'])(
    'answers 404 as a problem at %s',
    async (path) => {
      const res = await request(t.app).get(path).set('Accept', 'text/html');
      expect([res.status, res.type]).toEqual([404, 'application/problem+json']);
      expect(validatorOf('problem')(res.body)).toBe(true);
    },
  );

  it.each(['/api/v1/systems/%', '/api/v1/orbits/%E0%A4%A', '/%c0%ae'])(
    'survives the broken address %s',
    async (path) => {
      const res = await request(t.app).get(path);
      expect([res.status, res.body.code]).toEqual([400, 'invalid-address']);
    },
  );
});

describe('the schemas', () => {
  it.each([...schemaDocuments.keys()])('serves %s', async (name) => {
    const res = await request(t.app).get(`/schemas/${name}.schema.json`);
    expect(res.status).toBe(200);
    expect(JSON.parse(res.text)).toEqual(schemaDocuments.get(name));
  });

  it('knows no other', async () => {
    const res = await request(t.app).get('/schemas/nothing.schema.json');
    expect([res.status, res.type]).toEqual([404, 'application/problem+json']);
  });
});

describe('every answer', () => {
  it('forbids scripts of other sites and frames', async () => {
    const res = await request(t.app).get('/healthz');
    expect(res.status).toBe(200);
    expect(res.headers['content-security-policy']).toContain("script-src 'self';");
    expect(res.headers['content-security-policy']).toContain("frame-ancestors 'none'");
    expect(res.headers['content-security-policy']).not.toContain('upgrade-insecure-requests');
    expect(res.headers).toMatchObject({ 'x-content-type-options': 'nosniff', 'referrer-policy': 'no-referrer' });
    expect(res.headers['x-powered-by']).toBeUndefined();
    expect(res.headers['strict-transport-security']).toBeUndefined();
  });

  it('is compressed where the client can read it', async () => {
    const res = await request(t.app).get('/api/v1/openapi.json').set('Accept-Encoding', 'gzip');
    expect(res.headers['content-encoding']).toBe('gzip');
  });
});

describe('metrics', () => {
  it('are for this machine', async () => {
    const here = await request(t.app).get('/metrics');
    expect([here.status, here.type]).toEqual([200, 'text/plain']);
    expect((await request(t.app).get('/metrics').set('X-Forwarded-For', '192.0.2.1')).status).toBe(404);
  });

  it('are for whoever holds the token', async () => {
    const guarded = await testApp({ metricsToken: 'secret-token' });
    try {
      const ask = (token: string): request.Test =>
        request(guarded.app)
          .get('/metrics')
          .set({ 'X-Forwarded-For': '192.0.2.1', Authorization: `Bearer ${token}` });
      expect((await ask('secret-token')).status).toBe(200);
      expect((await ask('another-token')).status).toBe(404);
    } finally {
      await guarded.close();
    }
  });
});
