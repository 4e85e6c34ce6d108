import { STATUS_CODES } from 'node:http';
import { z } from 'zod';
import { operations, problem, type Operation } from '@/lib/contracts';
import { ENGINE } from '@/lib/reading';

type Json = Readonly<Record<string, unknown>>;

/** A zod schema as JSON Schema 2020-12, which is what OpenAPI 3.1 uses. Bodies are what one sends, answers what one gets. */
function jsonSchema(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
}

const content = (type: string, schema: Json) => ({ content: { [type]: { schema } } });

function parameters(operation: Operation): Json[] {
  const named = (schema: z.ZodType | undefined, place: 'path' | 'query') => {
    const { properties = {}, required = [] } = schema
      ? (jsonSchema(schema, 'input') as { properties?: Record<string, Json>; required?: string[] })
      : {};
    return Object.entries(properties).map(([name, shape]) => ({
      name,
      in: place,
      required: place === 'path' || required.includes(name),
      schema: shape,
    }));
  };
  const version = {
    name: 'If-Match',
    in: 'header',
    required: true,
    description: 'ETag of the version that is changed',
    schema: { type: 'string' },
  };
  return [...named(operation.params, 'path'), ...named(operation.query, 'query'), ...(operation.ifMatch ? [version] : [])];
}

function requestBody(operation: Operation): Json | null {
  if (operation.body) return { required: true, ...content('application/json', jsonSchema(operation.body, 'input')) };
  if (!operation.multipart) return null;
  const file = {
    type: 'object',
    required: ['file'],
    properties: { file: { type: 'string', contentMediaType: 'application/octet-stream' } },
  };
  return { required: true, ...content('multipart/form-data', file) };
}

/** Which problems an operation can answer: those it names and those that follow from what it is. */
export function problemStatuses(operation: Operation): number[] {
  const follow = [
    ...(operation.may === 'open' ? [] : [401, 403]),
    ...(operation.method === 'GET' ? [] : [403]),
    ...(operation.params ? [404] : []),
    ...(operation.query ? [422] : []),
    ...(operation.body ? [400, 413, 415, 422] : []),
    ...(operation.multipart ? [400, 413, 415, 422] : []),
    ...(operation.ifMatch ? [412, 428] : []),
  ];
  return [...new Set([...follow, ...(operation.problems ?? [])])].sort((a, b) => a - b);
}

function success(operation: Operation): Json {
  const description = STATUS_CODES[operation.status] ?? '';
  if (operation.media) return { description, ...content(operation.media, { type: 'string', contentMediaType: operation.media }) };
  return operation.answer ? { description, ...content('application/json', jsonSchema(operation.answer, 'output')) } : { description };
}

function describeOperation(id: string, operation: Operation): Json {
  const refused = (status: number) => [
    String(status),
    { description: STATUS_CODES[status] ?? '', ...content('application/problem+json', { $ref: '#/components/schemas/Problem' }) },
  ];
  const body = requestBody(operation);
  return {
    operationId: id,
    summary: operation.summary,
    tags: [operation.tag],
    parameters: parameters(operation),
    ...(body ? { requestBody: body } : {}),
    responses: {
      [operation.status]: success(operation),
      ...(operation.revalidates ? { 304: { description: 'Not Modified' } } : {}),
      ...Object.fromEntries(problemStatuses(operation).map(refused)),
    },
    ...(operation.may === 'open' ? { security: [] } : {}),
  };
}

let held: Json | undefined;

/** The API's description, OpenAPI 3.1, made from the very contracts that the endpoints parse by. */
export function openApi(cookieName: string): Json {
  if (held) return held;
  const paths: Record<string, Record<string, Json>> = {};
  for (const [id, operation] of Object.entries(operations) as [string, Operation][])
    (paths[operation.path] ??= {})[operation.method.toLowerCase()] = describeOperation(id, operation);
  held = {
    openapi: '3.1.0',
    info: { title: 'Couplet', version: ENGINE, description: 'Errors are RFC 9457 problem documents. Writes to a version carry If-Match.' },
    paths,
    components: {
      schemas: { Problem: jsonSchema(problem, 'output') },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: cookieName } },
    },
    security: [{ session: [] }],
  };
  return held;
}
