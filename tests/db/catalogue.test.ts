import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { findReading, type ModuleRecord } from '@db';
import { catalogueQuery, type ModuleBody } from '@/lib/contracts';
import { approvedModelOf, catalogueList, catalogueVendors, forgetCatalogue, moduleHistory, moduleShown } from '@/lib/server/catalogue';
import { dutySearch } from '@/lib/server/duty';
import { deliverMail } from '@/lib/server/mail';
import { changeModule } from '@/lib/server/parts';
import type { SignedInPerson } from '@/lib/server/people';
import { approve, handIn, returnToOwner, withdraw } from '@/lib/server/review';
import { module, person, reading, useDatabase } from '../support/database';

useDatabase();
beforeEach(forgetCatalogue);
afterEach(() => deliverMail());

const REASON = 'The 2.1 A curve was read along a grid line.';

let engineer: SignedInPerson, librarian: SignedInPerson, designer: SignedInPerson, administrator: SignedInPerson;
beforeEach(async () => {
  engineer = await person(['engineer'], 'Ilse Marrow');
  librarian = await person(['librarian'], 'Soren Quill');
  designer = await person(['designer'], 'Tamsin Vale');
  administrator = await person(['administrator'], 'Odd Fell');
});

const versionOf = async (id: number) => (await findReading(id))!.version;

async function handedIn(of: ModuleRecord): Promise<number> {
  const { id } = await reading(engineer, { of });
  await handIn(engineer, id, await versionOf(id), 'A note for the librarian.');
  return id;
}

async function approved(stated: Partial<ModuleBody> = {}): Promise<{ part: ModuleRecord; readingId: number }> {
  const part = await module(stated);
  const readingId = await handedIn(part);
  await approve(librarian, readingId, await versionOf(readingId));
  return { part, readingId };
}

const list = (texts: Record<string, string> = {}) => catalogueList(designer, catalogueQuery.parse(texts));
const duty = { heatW: 5, coldFaceC: 10, hotFaceC: 30 };

describe('the catalogue', () => {
  test('shows approved modules and no others', async () => {
    const { part } = await approved();
    await handedIn(await module());
    await reading(engineer, { of: await module() });
    const answer = await list();
    expect(answer).toMatchObject({ total: 1, found: 1, unstated: 0, page: 1, pages: 1 });
    expect(answer.rows).toMatchObject([{ id: part.id, vendor: { name: 'Ormsund Cold' }, grade: 'curves' }]);
    expect(answer.rows[0]?.approvedAt).toMatch(/^\d{4}-/);
  });

  test('tells what the model implies at 27 °C', async () => {
    // constants of the drafts of these tests: α 0.05 V/K, R 2.2 Ω, K 0.4 W/K, so Vmax is 0.05 · 300.15 V
    await approved();
    const [row] = (await list()).rows;
    expect(row?.vmax.value).toBeCloseTo(15.0075, 2);
    expect(row?.vmax.u).toBeGreaterThan(0);
  });

  test('renews its copy when a reading is approved or withdrawn, and when a module is changed', async () => {
    const { part, readingId } = await approved();
    expect((await list()).total).toBe(1);
    await approved();
    expect((await list()).total).toBe(2);
    const { id: _id, vendor, version: _version, ...identity } = part;
    await changeModule(librarian, part.id, 1, { ...identity, ratings: [], vendor: vendor.name, partNumber: 'Aldermere 30' });
    expect((await list({ q: 'alder' })).rows.map((row) => row.id)).toEqual([part.id]);
    await withdraw(librarian, readingId, await versionOf(readingId), REASON);
    expect((await list()).total).toBe(1);
    expect((await list({ q: 'alder' })).rows).toEqual([]);
  });

  test('finds by words of the sheet as well as of the part', async () => {
    await approved({ partNumber: 'Haff 40-X' });
    expect((await list({ q: '40x' })).found).toBe(1);
    expect((await list({ q: 'oc118 ormsund' })).found).toBe(1);
    expect((await list({ q: 'haff 50' })).found).toBe(0);
  });

  test('names the vendors it has something of, by name', async () => {
    await approved({ vendor: 'Veltrane' });
    await approved({ vendor: 'Ormsund Cold' });
    await module({ vendor: 'Thistlecap' });
    expect((await catalogueVendors()).map(({ name }) => name)).toEqual(['Ormsund Cold', 'Veltrane']);
  });

  test('cuts itself into pages', async () => {
    await approved();
    expect(await list({ page: '7' })).toMatchObject({ page: 1, pages: 1, found: 1 });
  });
});

describe('a module’s page', () => {
  test('names who read and who approved, the sheet, the picture and the hash', async () => {
    const { part, readingId } = await approved();
    const model = await approvedModelOf(designer, part.id);
    expect(model).toMatchObject({ readingId, readBy: 'Ilse Marrow', approvedBy: 'Soren Quill', currents: [1, 2, 3], hotSides: [27] });
    expect(model?.hash).toMatch(/^[0-9a-f]{64}$/);
    expect(model?.sheets).toMatchObject([{ number: 'OC-118' }]);
    expect(model?.pictures).toMatchObject([{ sheetId: model?.sheets[0]?.id }]);
  });

  test('has no model while nothing of it is approved', async () => {
    const part = await module();
    await handedIn(part);
    expect(await approvedModelOf(designer, part.id)).toBeNull();
    expect(await moduleShown(designer, String(part.id))).toMatchObject({ approved: null, candidate: null, history: [] });
  });

  test('is not there for a number that is none', async () => {
    for (const id of ['0', '12x', '-1', '99999']) await expect(moduleShown(designer, id)).rejects.toMatchObject({ status: 404 });
  });

  test('keeps from a designer what engineer and librarian wrote each other', async () => {
    const part = await module();
    const first = await handedIn(part);
    await returnToOwner(librarian, first, await versionOf(first), REASON);
    await handIn(engineer, first, await versionOf(first), 'Placed again.');
    await approve(librarian, first, await versionOf(first));
    const second = await handedIn(part);
    await returnToOwner(librarian, second, await versionOf(second), REASON);
    expect((await moduleHistory(engineer, part.id)).map(({ what }) => what)).toContain('returned');
    for (const who of [designer, administrator]) {
      const history = await moduleHistory(who, part.id);
      expect(history.map(({ what }) => what)).toEqual(['approved']);
      expect(JSON.stringify(history)).not.toContain('grid line');
    }
  });
});

describe('the duty search on the server', () => {
  test('looks through approved modules only', async () => {
    const { part } = await approved({ partNumber: 'Haff 40' });
    await handedIn(await module());
    const answer = await dutySearch(designer, duty);
    expect(answer).toMatchObject({ candidates: 1, matchCount: 1, missCount: 0, condensation: null });
    expect(answer.matches).toMatchObject([{ module: { id: part.id, name: 'Haff 40', vendor: 'Ormsund Cold' } }]);
  });

  test('answers with no more rows than asked for, but counts all', async () => {
    await approved();
    await approved();
    expect(await dutySearch(designer, duty, 1)).toMatchObject({ matchCount: 2, matches: [expect.anything()] });
  });

  test('holds the highest temperature and the allowed current of the sheet against the duty', async () => {
    const rating = {
      hotSideC: 27,
      vmaxV: null,
      qmaxW: null,
      dTmaxK: null,
      basis: 'notStated',
      atmosphere: 'notStated',
      tolerancePercent: null,
    } as const;
    await approved({ maxTemperatureC: 25 });
    await approved({ ratings: [{ ...rating, imaxA: 0.2, imaxMeans: 'allowed' }] });
    const { misses } = await dutySearch(designer, duty);
    expect(misses.flatMap(({ reasons }) => reasons.map(({ kind }) => kind)).sort()).toEqual(['allowedCurrent', 'temperature']);
  });

  test('is not for an administrator', async () => {
    await expect(dutySearch(administrator, duty)).rejects.toMatchObject({ status: 403 });
  });
});
