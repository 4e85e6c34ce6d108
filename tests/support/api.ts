import { checkAgainstDescription } from './contract';
import { PASSWORD, PEOPLE, type Who } from './people';

/** An API client that keeps its cookie and sends what a browser of the same site sends. */
export function client(base: string) {
  let cookie = '';
  const call = async (method: string, path: string, body?: unknown, headers: Record<string, string> = {}): Promise<Response> => {
    const form = body instanceof FormData;
    const answer = await fetch(`${base}${path}`, {
      method,
      redirect: 'manual',
      headers: {
        Origin: base,
        'Sec-Fetch-Site': 'same-origin',
        ...(cookie ? { Cookie: cookie } : {}),
        ...(body === undefined || form ? {} : { 'Content-Type': 'application/json' }),
        ...headers,
      },
      body: body === undefined ? undefined : form ? body : JSON.stringify(body),
    });
    const set = answer.headers.getSetCookie().find((line) => line.startsWith('couplet='));
    if (set) cookie = set.split(';')[0] ?? '';
    await checkAgainstDescription(base, method, path.split('?')[0] ?? path, answer);
    return answer;
  };
  return {
    call,
    cookie: () => cookie,
    useCookie: (value: string) => (cookie = value),
    get: (path: string, headers?: Record<string, string>) => call('GET', path, undefined, headers),
    post: (path: string, body?: unknown, headers?: Record<string, string>) => call('POST', path, body ?? {}, headers),
    put: (path: string, body: unknown, headers?: Record<string, string>) => call('PUT', path, body, headers),
    del: (path: string) => call('DELETE', path),
    upload: (path: string, bytes: Uint8Array, name: string) => {
      const form = new FormData();
      form.append('file', new Blob([new Uint8Array(bytes)]), name);
      return call('POST', path, form);
    },
  };
}

export type Client = ReturnType<typeof client>;

/** A client of somebody who has signed in, or of nobody. */
export async function clientOf(base: string, who: Who | null): Promise<Client> {
  const made = client(base);
  if (who) {
    const answer = await made.post('/api/session', { email: PEOPLE[who], password: PASSWORD });
    if (answer.status !== 200) throw new Error(`${who} could not sign in: ${answer.status}`);
  }
  return made;
}

/** Somebody whom an administrator has just added, signed in: for tests that change the person. */
export async function newcomer(base: string, roles: readonly string[]) {
  const administrator = await clientOf(base, 'administrator');
  const email = `newcomer-${Math.random().toString(36).slice(2, 10)}@kelda.example`;
  const added = (await (await administrator.post('/api/people', { email, name: 'New Comer', roles })).json()) as {
    person: { id: string };
    password: string;
  };
  const { password } = added;
  const made = client(base);
  await made.post('/api/session', { email, password });
  return { ...made, email, password, id: added.person.id };
}
