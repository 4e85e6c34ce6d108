import { afterEach, describe, expect, test, vi } from 'vitest';
import { api, ApiProblem, ask } from '@/components/islands/api';
import { worthRetrying } from '@/components/islands/query';

const answer = (status: number, body: unknown, headers: Record<string, string> = {}) => {
  const fetched = vi.fn<typeof fetch>(() =>
    Promise.resolve(new Response(body === undefined ? null : JSON.stringify(body), { status, headers })),
  );
  vi.stubGlobal('fetch', fetched);
  return fetched;
};
const problemOf = (work: Promise<unknown>) =>
  work.then(
    () => expect.fail('was not refused'),
    (fault: unknown) => fault as ApiProblem,
  );

afterEach(() => vi.unstubAllGlobals());

describe('asking the API', () => {
  test('gives the answer with its version', async () => {
    answer(200, { version: 4 }, { ETag: '"4"' });
    expect(await ask('/api/readings/1')).toEqual({ data: { version: 4 }, etag: '"4"' });
  });

  test('sends JSON with the version it changes', async () => {
    const fetched = answer(200, {});
    await api.put('/api/readings/1', { document: {} }, { ifMatch: '"4"' });
    const [, init] = fetched.mock.calls[0]!;
    const headers = init!.headers as Headers;
    expect([init!.method, headers.get('if-match'), headers.get('content-type'), init!.body]).toEqual([
      'PUT',
      '"4"',
      'application/json',
      '{"document":{}}',
    ]);
  });

  test('gives nothing for an answer without a body', async () => {
    answer(204, undefined);
    expect(await api.delete('/api/session')).toBeUndefined();
  });

  test('turns a problem document into its sentence, its fields and whatever it carries', async () => {
    answer(412, { type: 'urn:x', title: 'Precondition Failed', status: 412, detail: 'Somebody saved first.', current: { version: 5 } });
    const problem = await problemOf(api.put('/api/readings/1', {}));
    expect(problem).toBeInstanceOf(ApiProblem);
    expect([problem.status, problem.detail, problem.document.current]).toEqual([412, 'Somebody saved first.', { version: 5 }]);
    answer(422, { type: 'urn:x', title: 'Unprocessable', status: 422, detail: 'One thing is wrong.', fields: { heatW: 'Type a number.' } });
    expect((await problemOf(api.post('/api/duty', {}))).fields).toEqual({ heatW: 'Type a number.' });
  });

  test('has a sentence even when the answer is no problem document, and when there is none', async () => {
    vi.stubGlobal('fetch', () => Promise.resolve(new Response('<h1>Bad gateway</h1>', { status: 502 })));
    const broken = await problemOf(api.get('/api/me'));
    expect([broken.status, broken.offline]).toEqual([502, false]);
    expect(broken.detail).toMatch(/\.$/);
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('failed')));
    const silent = await problemOf(api.get('/api/me'));
    expect([silent.status, silent.offline]).toEqual([0, true]);
    expect(silent.detail).toMatch(/cannot be reached/);
  });

  test('lets an abort through as an abort', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new DOMException('stop', 'AbortError')));
    expect(await problemOf(api.get('/api/me'))).toMatchObject({ name: 'AbortError' });
  });
});

describe('asking again', () => {
  test('is worth it after a silence or a fault of the server, twice', () => {
    expect(worthRetrying(0, new ApiProblem(0, 'silence'))).toBe(true);
    expect(worthRetrying(1, new ApiProblem(503, 'busy'))).toBe(true);
    expect(worthRetrying(2, new ApiProblem(503, 'busy'))).toBe(false);
  });

  test.each([400, 401, 403, 404, 412, 422, 429])('is never worth it after %d', (status) => {
    expect(worthRetrying(0, new ApiProblem(status, 'no'))).toBe(false);
  });
});
