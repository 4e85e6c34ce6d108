import { Validator } from '@seriousme/openapi-schema-validator';
import { expect, inject, test } from 'vitest';
import { operations, type Operation } from '@/lib/contracts';
import { client } from '../support/api';

const base = inject('baseUrl');

test('the description is valid OpenAPI 3.1 and names every call', async () => {
  const description = (await (await fetch(`${base}/api/openapi.json`)).json()) as { openapi: string; paths: Record<string, object> };
  const { valid, errors } = await new Validator().validate(description);
  expect(errors ?? []).toEqual([]);
  expect(valid).toBe(true);
  expect(description.openapi).toBe('3.1.0');
  for (const operation of Object.values(operations) as Operation[])
    expect(description.paths[operation.path]).toHaveProperty(operation.method.toLowerCase());
});

test('a call that the description does not know fails the test that makes it', async () => {
  await expect(client(base).get('/api/no-such-call')).rejects.toThrow('is no call of the description');
  await expect(client(base).del('/api/health')).rejects.toThrow('is no call of the description');
});
