import express from 'express';
import request from 'supertest';
import { problemResponses } from '@/server/http/problem-response';
import { sameOriginOnly } from '@/server/http/same-origin';
import { createLog } from '@/server/log';

const app = express();
app.use(sameOriginOnly('https://orbits.example'));
app.all('/', (_req, res) => {
  res.json({});
});
app.use(problemResponses(createLog({ logLevel: 'silent' }, 'test')));

const cookie = 'ritornel.sign-in=s%3Ax';
const host = 'internal:4170';

describe('a state-changing request with the sign-in cookie', () => {
  it.each([
    [{ 'Sec-Fetch-Site': 'cross-site' }],
    [{ 'Sec-Fetch-Site': 'same-site' }],
    [{ Origin: 'https://evil.example' }],
    [{ Origin: 'null' }],
    [{ Origin: 'https://orbits.example.evil.example' }],
    [{ Origin: 'https://orbits.example', 'Sec-Fetch-Site': 'cross-site' }],
    [{ Origin: 'https://evil.example', 'Sec-Fetch-Site': 'same-origin' }],
  ])('is refused with %j', async (headers) => {
    const res = await request(app)
      .post('/')
      .set({ Host: host, Cookie: cookie, ...headers });
    expect(res.status).toBe(403);
    expect(res.body.code).toBe('cross-site');
  });

  it.each<[Record<string, string>]>([
    [{}],
    [{ 'Sec-Fetch-Site': 'same-origin' }],
    [{ 'Sec-Fetch-Site': 'none' }],
    [{ Origin: 'https://orbits.example' }],
    [{ Origin: 'http://internal:4170' }],
  ])('passes with %j', async (headers) => {
    const res = await request(app)
      .delete('/')
      .set({ Host: host, Cookie: cookie, ...headers });
    expect(res.status).toBe(200);
  });
});

it('lets other sites read, and send what carries no cookie', async () => {
  const read = await request(app).get('/').set({ Cookie: cookie, 'Sec-Fetch-Site': 'cross-site' });
  const anonymous = await request(app).post('/').set({ 'Sec-Fetch-Site': 'cross-site', Cookie: 'theme=plate' });
  expect([read.status, anonymous.status]).toEqual([200, 200]);
});
