import { Validator } from '@seriousme/openapi-schema-validator';
import { expect, inject, test } from 'vitest';
import { operations, type Operation } from '@/lib/contracts';

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
