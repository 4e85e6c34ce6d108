import type { Problem } from '@/lib/contracts';

/** What the server answered instead of the thing asked for: a sentence to show, and one for each field that is wrong. */
export class ApiProblem extends Error {
  override readonly name = 'ApiProblem';

  constructor(
    readonly status: number,
    readonly detail: string,
    readonly fields: Readonly<Record<string, string>> = {},
    /** The whole document, with whatever else it carries (`current` of a lost race). */
    readonly document: Readonly<Record<string, unknown>> = {},
  ) {
    super(detail);
  }

  /** 0 where no answer came at all. */
  get offline(): boolean {
    return this.status === 0;
  }
}

export interface Answer<T> {
  readonly data: T;
  readonly etag: string | null;
}

export interface AskOptions {
  readonly method?: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** Sent as JSON. */
  readonly body?: unknown;
  /** Version the change is made to, as it came in the ETag. */
  readonly ifMatch?: string | undefined;
  readonly signal?: AbortSignal | undefined;
}

const OFFLINE = 'The server cannot be reached. What you typed is still here; try again in a moment.';
const NO_SENTENCE = 'The server could not do that. Try again; if it fails again, tell the administrator.';

/** The problem in an answer that is not 2xx. */
function problemOf(status: number, document: unknown): ApiProblem {
  const problem = (typeof document === 'object' && document !== null ? document : {}) as Partial<Problem>;
  return new ApiProblem(status, problem.detail ?? problem.title ?? NO_SENTENCE, problem.fields ?? {}, problem as Record<string, unknown>);
}

const parseBody = (text: string): unknown => {
  if (text === '') return undefined;
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
};

/** Asks the API and gives the answer with its ETag; throws ApiProblem for anything but 2xx, AbortError when aborted. */
export async function ask<T>(path: string, { method = 'GET', body, ifMatch, signal }: AskOptions = {}): Promise<Answer<T>> {
  const headers = new Headers({ Accept: 'application/json' });
  if (body !== undefined || method !== 'GET') headers.set('Content-Type', 'application/json');
  if (ifMatch !== undefined) headers.set('If-Match', ifMatch);
  const init: RequestInit = { method, headers, credentials: 'same-origin', signal: signal ?? null };
  if (body !== undefined) init.body = JSON.stringify(body);
  const response = await fetch(path, init).catch((fault: unknown) => {
    if (fault instanceof DOMException && fault.name === 'AbortError') throw fault;
    throw new ApiProblem(0, OFFLINE);
  });
  const document = parseBody(await response.text());
  if (!response.ok) throw problemOf(response.status, document);
  return { data: document as T, etag: response.headers.get('ETag') };
}

export const api = {
  get: async <T>(path: string, signal?: AbortSignal) => (await ask<T>(path, { signal })).data,
  post: async <T>(path: string, body: unknown = {}, options: Omit<AskOptions, 'method' | 'body'> = {}) =>
    (await ask<T>(path, { ...options, method: 'POST', body })).data,
  put: async <T>(path: string, body: unknown, options: Omit<AskOptions, 'method' | 'body'> = {}) =>
    (await ask<T>(path, { ...options, method: 'PUT', body })).data,
  delete: async <T = void>(path: string, options: Omit<AskOptions, 'method'> = {}) =>
    (await ask<T>(path, { ...options, method: 'DELETE' })).data,
};

export interface SendProgress {
  readonly sentBytes: number;
  readonly totalBytes: number;
  /** True once all bytes are with the server and it is working on them. */
  readonly processing: boolean;
}

export interface SendOptions {
  readonly onProgress?: (progress: SendProgress) => void;
  readonly signal?: AbortSignal;
}

/** Sends a form with files, telling how many bytes are through; an abort stops the transfer and throws AbortError. */
export function sendForm<T>(path: string, form: FormData, { onProgress, signal }: SendOptions = {}): Promise<T> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    const aborted = () => reject(new DOMException('The upload was cancelled.', 'AbortError'));
    if (signal?.aborted) return aborted();
    signal?.addEventListener('abort', () => request.abort(), { once: true });
    request.upload.addEventListener('progress', ({ loaded, total }) =>
      onProgress?.({ sentBytes: loaded, totalBytes: total, processing: loaded === total }),
    );
    request.addEventListener('load', () => {
      const document = parseBody(request.responseText);
      if (request.status >= 200 && request.status < 300) resolve(document as T);
      else reject(problemOf(request.status, document));
    });
    request.addEventListener('error', () => reject(new ApiProblem(0, OFFLINE)));
    request.addEventListener('abort', aborted);
    request.open('POST', path);
    request.setRequestHeader('Accept', 'application/json');
    request.send(form);
  });
}
