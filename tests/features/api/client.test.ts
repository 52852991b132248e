import { ApiError } from '@/features/api/api-error';
import { apiAddress, getJson, postJson, requestJson } from '@/features/api/client';
import { failureWords } from '@/features/api/failure-words';
import { fakeArchive, problem } from '../../support/fake-archive';

const failureOf = async (request: Promise<unknown>): Promise<ApiError> => {
  const error: unknown = await request.then(
    () => null,
    (reason: unknown) => reason,
  );
  if (!(error instanceof ApiError)) throw new Error('the request should have been refused');
  return error;
};

describe('apiAddress', () => {
  it('leaves out what has no value and keeps every digit', () => {
    const query = { period: '1.55865221071617472800', text: '', near: undefined, limit: 25 };
    expect(apiAddress('/orbits', query)).toBe('/api/v1/orbits?period=1.55865221071617472800&limit=25');
  });

  it('encodes the names of parameters', () => {
    expect(apiAddress('/orbits', { 'parameters[rho]': '28' })).toBe('/api/v1/orbits?parameters%5Brho%5D=28');
  });
});

describe('requestJson', () => {
  it('reads the answer and its ETag', async () => {
    fakeArchive({ 'GET /orbits/RTN-0000001X': { body: { accession: 'RTN-0000001X' }, headers: { ETag: '"a"' } } });
    expect(await requestJson('/orbits/RTN-0000001X')).toEqual({ data: { accession: 'RTN-0000001X' }, etag: '"a"' });
  });

  it('sends a body as JSON, as typed', async () => {
    const calls = fakeArchive({ 'POST /checks': { body: {} } });
    await postJson('/checks', { period: '1.50' });
    expect(calls[0]).toMatchObject({ body: { period: '1.50' }, headers: { 'Content-Type': 'application/json' } });
  });

  it('answers nothing to 204', async () => {
    fakeArchive({ 'DELETE /session': { body: undefined, status: 204 } });
    expect((await requestJson('/session', { method: 'DELETE' })).data).toBeUndefined();
  });

  it('gives the code, the request id and the sentences of a refusal', async () => {
    const refusal = problem(422, 'invalid-content', 'Something cannot be right.') as { body: object };
    const errors = [{ pointer: '/point/1', message: 'needs a number', position: null }];
    fakeArchive({ 'POST /checks': { ...refusal, status: 422, body: { ...refusal.body, errors } } });
    const error = await failureOf(postJson('/checks', {}));
    expect(error).toMatchObject({ kind: 'refused', status: 422, code: 'invalid-content', requestId: '7f3c-19a2' });
    expect(error.messageAt('/point/1')).toBe('needs a number');
    expect(error.messageAt('/point/0')).toBeNull();
  });

  it('survives an error that is not JSON', async () => {
    fakeArchive({ 'GET /orbits': { status: 502, headers: { 'Content-Type': 'text/html' }, body: '<html>' } });
    expect(await failureOf(getJson('/orbits'))).toMatchObject({ kind: 'server', status: 502, code: null });
  });

  it('tells being offline from an answer that is late', async () => {
    fakeArchive({ 'GET /orbits': 'offline', 'GET /systems': 'never' });
    expect((await failureOf(getJson('/orbits'))).kind).toBe('offline');
    const late = await failureOf(getJson('/systems', { timeoutMs: 20 }));
    expect(late.kind).toBe('timeout');
    expect(late.message).toContain('longer than 0.02 s');
  });

  it('does not call it an error when the client itself stopped asking', async () => {
    fakeArchive({ 'GET /orbits': 'never' });
    const stop = new AbortController();
    const asked = getJson('/orbits', { signal: stop.signal });
    stop.abort();
    await expect(asked).rejects.not.toBeInstanceOf(ApiError);
  });
});

describe('failureWords', () => {
  it('gives the one sentence about a field rather than the general one', () => {
    const error = new ApiError({
      kind: 'refused',
      message: 'Something in the body cannot be right.',
      problem: {
        type: '',
        title: '',
        status: 422,
        detail: '',
        code: 'invalid-content',
        instance: 'id',
        errors: [{ pointer: '/period', message: 'The period is negative.', position: null }],
        meanwhile: null,
      },
    });
    expect(failureWords(error, 'The check', '')).toEqual({
      title: 'The check was refused',
      sentence: 'The period is negative.',
      requestId: 'id',
    });
  });

  it('does not show what broke on the page itself', () => {
    expect(failureWords(new TypeError('x is undefined'), 'The check', 'Nothing was lost.').sentence).toBe(
      'Something broke on this page. Nothing was lost.',
    );
  });
});
