import type { APIContext, APIRoute } from 'astro';
import { type z } from 'zod';
import { can } from '@/lib/access';
import type { Operation } from '@/lib/contracts';
import { log } from '../log';
import type { SignedInPerson } from '../people';
import { missingVersion, notAllowed, notSignedIn, Refusal, wrongInput } from '../refusal';
import { problemResponse } from './problem';

type Parsed<T> = T extends z.ZodType ? z.output<T> : undefined;

/** What a handler gets: everything parsed by the operation's contract. */
export interface Call<O extends Operation> {
  readonly params: Parsed<O['params']>;
  readonly query: Parsed<O['query']>;
  readonly body: Parsed<O['body']>;
  /** The signed-in person; only an `open` operation may find nobody here. */
  readonly actor: O['may'] extends 'open' ? SignedInPerson | null : SignedInPerson;
  /** The version named by If-Match, where the operation asks for one. */
  readonly version: O['ifMatch'] extends true ? number : undefined;
  readonly context: APIContext;
}

type Answer<O extends Operation> = O['answer'] extends z.ZodType ? z.input<O['answer']> : undefined;
type Reply<O extends Operation> = Response | Answer<O> | { readonly data: Answer<O>; readonly headers: HeadersInit };

const LARGEST_JSON_BYTES = 8 * 1024 * 1024;
const VERSION_TAG = /^"(\d{1,12})"$/;

/** The ETag of a numbered version. */
export const versionTag = (version: number) => `"${version}"`;

/** An answer with its version as ETag, beside other headers. */
export const withVersion = <T>(data: T, version: number, headers: Record<string, string> = {}) => ({
  data,
  headers: { ETag: versionTag(version), ...headers },
});

/** Makes a route of an operation: parse by contract, ask the matrix, call, answer. */
export function endpoint<O extends Operation>(operation: O, work: (call: Call<O>) => Promise<Reply<O>> | Reply<O>): APIRoute {
  return async (context) => {
    try {
      return answer(operation, await work(await readCall(operation, context)));
    } catch (error) {
      if (error instanceof Refusal) {
        if (error.status === 403) log.info({ path: operation.path, method: operation.method, who: context.locals.actor?.id }, 'refused');
        return problemResponse(error);
      }
      log.error({ err: error, path: operation.path, method: operation.method }, 'unexpected error');
      return problemResponse(new Refusal(500, 'unexpected', 'Something went wrong on our side, and nothing of this was saved. Try again.'));
    }
  };
}

async function readCall<O extends Operation>(operation: O, context: APIContext): Promise<Call<O>> {
  const actor = context.locals.actor;
  if (operation.may !== 'open') {
    if (!actor) throw notSignedIn();
    if (!can(actor, operation.may)) throw notAllowed();
  }
  return {
    params: parsePart(operation.params, context.params, 404),
    query: parsePart(operation.query, Object.fromEntries(context.url.searchParams), 422),
    body: operation.body ? parsePart(operation.body, await readJson(context.request), 422) : undefined,
    actor,
    version: operation.ifMatch ? requireVersion(context.request) : undefined,
    context,
  } as Call<O>;
}

function parsePart(schema: z.ZodType | undefined, value: unknown, status: 404 | 422): unknown {
  if (!schema) return undefined;
  const parsed = schema.safeParse(value, { reportInput: true });
  if (parsed.success) return parsed.data;
  if (status === 404) throw new Refusal(404, 'not-found', 'There is nothing at this address.');
  throw wrongInput(fieldSentences(parsed.error));
}

/** One sentence a field: `charts[0].marks[2].px` → what is wrong with it. */
export function fieldSentences(error: z.ZodError): Record<string, string> {
  const entries = error.issues.map((issue) => [pathName(issue.path), sentenceOf(issue)] as const);
  return Object.fromEntries(entries.reverse());
}

/** Our contracts speak in sentences; what the library says by itself is made into one. */
function sentenceOf(issue: z.core.$ZodIssue): string {
  if (issue.code === 'unrecognized_keys') return `There is nothing called ${issue.keys.join(', ')} here: leave it out.`;
  if (issue.code === 'invalid_type' && issue.input === undefined && issue.message.startsWith('Invalid')) return 'This is missing.';
  return /[.!?]$/.test(issue.message) ? issue.message : `${issue.message}.`;
}

const pathName = (path: readonly PropertyKey[]) =>
  path.reduce<string>(
    (name, part) => (typeof part === 'number' ? `${name}[${part}]` : name ? `${name}.${String(part)}` : String(part)),
    '',
  );

async function readJson(request: Request): Promise<unknown> {
  const type = request.headers.get('content-type')?.split(';')[0]?.trim().toLowerCase();
  if (type !== 'application/json') throw new Refusal(415, 'not-json', 'Send the body as application/json.');
  if (Number(request.headers.get('content-length') ?? 0) > LARGEST_JSON_BYTES) throw tooLarge();
  const text = await readText(request);
  try {
    return JSON.parse(text);
  } catch {
    throw new Refusal(400, 'broken-json', 'The body is not valid JSON.');
  }
}

/** The body as text, read no further than the limit whatever its length says. */
async function readText(request: Request): Promise<string> {
  const parts: Uint8Array[] = [];
  let bytes = 0;
  for await (const part of request.body ?? []) {
    bytes += part.byteLength;
    if (bytes > LARGEST_JSON_BYTES) throw tooLarge();
    parts.push(part);
  }
  return Buffer.concat(parts).toString('utf8');
}

const tooLarge = () => new Refusal(413, 'too-large', 'The body is larger than 8\u00A0MB.');

function requireVersion(request: Request): number {
  const tag = VERSION_TAG.exec(request.headers.get('if-match') ?? '');
  if (!tag) throw missingVersion();
  return Number(tag[1]);
}

function answer<O extends Operation>(operation: O, reply: Reply<O>): Response {
  if (reply instanceof Response) return reply;
  if (operation.status === 204) return new Response(null, { status: 204 });
  const wrapped = reply !== null && typeof reply === 'object' && 'data' in reply && 'headers' in reply;
  return Response.json(wrapped ? reply.data : reply, { status: operation.status, headers: wrapped ? reply.headers : {} });
}
