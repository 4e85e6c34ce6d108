import { beforeAll, describe, expect, inject, test } from 'vitest';
import type { CatalogueAnswer, DutyAnswer, ModuleModel, Problem } from '@/lib/contracts';
import { clientOf, type Client } from '../support/api';
import { approveModule, NOT_STATED, sheetWithChart } from '../support/approved';

// Every answer here is held against its description by the client itself.
const base = inject('baseUrl');
const VENDOR = 'Sandpiper Thermal';
let designer: Client, engineer: Client;
let part: number;

beforeAll(async () => {
  const librarian = await clientOf(base, 'librarian');
  [designer, engineer] = await Promise.all([clientOf(base, 'designer'), clientOf(base, 'engineer')]);
  const sheet = await sheetWithChart(engineer, VENDOR, 'ST-3');
  part = await approveModule({ engineer, librarian }, sheet, { vendor: VENDOR, partNumber: 'Dunlin 40-R', stages: 1 });
});

const list = async (query: string) => (await (await designer.get(`/api/catalogue${query}`)).json()) as CatalogueAnswer;

describe('GET /api/catalogue', () => {
  test('finds a module by words and filters', async () => {
    expect((await list('?q=dunlin40r&stages=1&heatFrom=5&sort=qmax&order=descending')).rows).toMatchObject([{ id: part, stages: 1 }]);
    expect(await list('?q=dunlin&sideTo=500')).toMatchObject({ found: 0, unstated: 1 });
  });

  test.each(['?heatFrom=lots', '?sort=colour', '?vendor=x', '?nonsense=1'])('refuses %s with a sentence for the field', async (query) => {
    const answer = await designer.get(`/api/catalogue${query}`);
    expect(answer.status).toBe(422);
    const { fields } = (await answer.json()) as Problem;
    expect(Object.values(fields ?? {})[0]).toMatch(/\S/);
  });
});

describe('GET /api/modules/{id}/model', () => {
  test('gives the model with its evidence', async () => {
    const model = (await (await designer.get(`/api/modules/${part}/model`)).json()) as ModuleModel;
    expect(model).toMatchObject({ module: { partNumber: 'Dunlin 40-R' }, readBy: 'Ilse Marrow', hotSides: [27] });
    expect(model.model.parameters.map(({ name }) => name)).toEqual(['alpha', 'R', 'K']);
    const picture = await designer.get(model.pictures[0]!.url);
    expect(picture.headers.get('content-type')).toBe('image/png');
  });

  test('says that nothing is approved yet where nothing is', async () => {
    const made = await engineer.post('/api/modules', { ...NOT_STATED, vendor: VENDOR, partNumber: 'Dunlin 8' });
    const { id } = (await made.json()) as { id: number };
    const answer = await designer.get(`/api/modules/${id}/model`);
    expect(answer.status).toBe(404);
    expect(((await answer.json()) as Problem).detail).toContain('No reading of this module is approved yet');
  });
});

describe('POST /api/duty', () => {
  const duty = { heatW: 5, coldFaceC: 10, hotFaceC: 30 };
  const ask = (body: object) => designer.post('/api/duty', body);

  test('tells how each module runs, and the dew point', async () => {
    const answer = (await (await ask({ ...duty, ambientC: 30, humidityPercent: 60 })).json()) as DutyAnswer;
    // α 0.05 V/K, R 2.2 Ω, K 0.4 W/K: I = (14.1575 − √(14.1575² − 4.4 · 13))/2.2 = 0.9952 A
    const match = answer.matches.find(({ module }) => module.id === part);
    expect(match?.current.value).toBeCloseTo(0.995, 2);
    expect(answer.matchCount + answer.missCount).toBe(answer.candidates);
    expect(answer.condensation).toMatchObject({ kind: 'dew' });
    expect(answer.condensation?.celsius).toBeCloseTo(21.39, 2);
  });

  test.each([
    [{ ...duty, heatW: 0 }, 'heatW'],
    [{ ...duty, humidityPercent: 130 }, 'humidityPercent'],
    [{ heatW: 5, coldFaceC: 10 }, 'hotFaceC'],
    [{ ...duty, coldFaceC: '10' }, 'coldFaceC'],
  ])('refuses %j, naming %s', async (body, field) => {
    const answer = await ask(body);
    expect(answer.status).toBe(422);
    expect(((await answer.json()) as Problem).fields).toHaveProperty(field);
  });
});
