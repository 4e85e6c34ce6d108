import { execFile } from 'node:child_process';
import { readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { closeDatabase, findReading, latestModel, type ModelRecord, type PictureRecord } from '@db';
import { deliverMail } from '@/lib/server/mail';
import type { SignedInPerson } from '@/lib/server/people';
import { approve, handIn, hashOfStored, withdraw } from '@/lib/server/review';
import { verify } from '@/lib/server/verify';
import { connection } from '../../db/database';
import { person, reading, useDatabase } from '../support/database';
import { keptPicture } from '../support/kept-picture';

useDatabase();

let engineer: SignedInPerson;
let librarian: SignedInPerson;
let page: PictureRecord;
let id: number;
let model: ModelRecord;

const versionOf = async () => (await findReading(id))!.version;
const sql = (text: string) => connection().query(text);
const fileOf = (sha256: string) => path.join(process.env.COUPLET_DATA!, 'uploads', sha256.slice(0, 2), sha256.slice(2, 4), sha256);

/** One byte in the middle of a kept file becomes another. */
function damage(sha256: string): void {
  const bytes = readFileSync(fileOf(sha256));
  bytes[bytes.length >> 1]! ^= 1;
  writeFileSync(fileOf(sha256), bytes);
}

beforeEach(async () => {
  engineer = await person(['engineer']);
  librarian = await person(['librarian']);
  page = await keptPicture(engineer);
  ({ id } = await reading(engineer, { page }));
  await handIn(engineer, id, await versionOf(), '');
  await approve(librarian, id, await versionOf());
  model = (await latestModel(id))!;
  await deliverMail();
});
afterEach(() => deliverMail());

test('what nobody touched has no fault', async () => {
  expect(await verify()).toEqual({ models: 1, files: 2, faults: [] });
});

test('what was withdrawn and what waits for review is looked at as well', async () => {
  await withdraw(librarian, id, await versionOf(), 'The sheet was replaced by revision C.');
  const second = await reading(engineer, { page: await keptPicture(engineer) });
  await handIn(engineer, second.id, second.version, '');
  expect(await verify()).toEqual({ models: 2, files: 4, faults: [] });
  await sql(`UPDATE models SET engine = '0.9.0'`);
  expect((await verify()).faults.filter((fault) => fault.includes('was changed'))).toHaveLength(2);
});

describe('tampering is found', () => {
  const otherAlpha = `replace(result, '"alpha":{"value":0.05', '"alpha":{"value":0.06')`;

  test.each([
    ['a point of the frozen document', () => sql(`UPDATE models SET document = replace(document, '"value":1,', '"value":1.1,')`)],
    ['a figure of the frozen model', () => sql(`UPDATE models SET result = ${otherAlpha}`)],
    ['the hash', () => sql(`UPDATE models SET hash = '${'0'.repeat(64)}'`)],
    ['the engine', () => sql(`UPDATE models SET engine = '0.9.0'`)],
    ['the pixels a chart stands on', () => sql(`UPDATE models SET result = replace(result, '${page.pixelsSha256}', '${'0'.repeat(64)}')`)],
  ])('in %s: the hash does not fit', async (_what, tamper) => {
    await tamper();
    expect(await latestModel(id)).not.toEqual(model);
    const { faults } = await verify();
    expect(faults[0]).toMatch(/^Model 1 of reading 1 was changed: its hash is [0-9a-f]{64}, and what is stored gives [0-9a-f]{64}\.$/);
  });

  test('in a model whose hash was made to fit: reading again gives another model', async () => {
    await sql(`UPDATE models SET result = ${otherAlpha}`);
    await sql(`UPDATE models SET hash = '${hashOfStored((await latestModel(id))!)}'`);
    expect((await verify()).faults).toEqual([expect.stringContaining('gives another model when it is read again')]);
  });

  test('in the draft of what was approved', async () => {
    await sql(`UPDATE readings SET document = replace(document, '"value":2,', '"value":2.1,')`);
    expect((await verify()).faults).toEqual([expect.stringContaining('has a draft that is not what was approved')]);
  });

  test('in a newer model that nobody approved', async () => {
    await sql(`INSERT INTO models (reading_id, module_id, document, result, engine, hash, created_at)
      SELECT reading_id, module_id, document, result, engine, hash, created_at FROM models`);
    expect((await verify()).faults).toEqual([expect.stringContaining('has model 2, which is not the one that was approved')]);
  });

  test('in an approval without its model', async () => {
    await sql('UPDATE decisions SET model_id = NULL');
    await sql('DELETE FROM models');
    expect(await verify()).toMatchObject({ models: 0, faults: [expect.stringContaining('has no model')] });
  });

  test.each([
    ['upload', () => page.fileSha256],
    ['intake picture', () => page.pngSha256],
  ])('in the bytes of the %s', async (what, sha256) => {
    damage(sha256());
    expect((await verify()).faults).toEqual([expect.stringMatching(new RegExp(`^The ${what} of picture 1 .* is damaged\\.$`))]);
  });

  test.each([
    ['upload', () => page.fileSha256],
    ['intake picture', () => page.pngSha256],
  ])('in the loss of the %s', async (what, sha256) => {
    rmSync(fileOf(sha256()));
    expect((await verify()).faults).toEqual([expect.stringMatching(new RegExp(`^The ${what} of picture 1 .* is gone\\.$`))]);
  });

  test('in a picture that was put in place of another', async () => {
    const other = await keptPicture(engineer);
    await sql(`UPDATE pictures SET png_sha256 = '${other.pngSha256}' WHERE id = ${page.id}`);
    expect((await verify()).faults).toEqual([expect.stringContaining('does not have the pixels')]);
  });
});

describe('npm run verify', { timeout: 120_000 }, () => {
  const run = () =>
    new Promise<{ status: number; out: string }>((resolve) => {
      execFile(process.execPath, ['--import', 'tsx', 'scripts/verify.ts'], (error, out, err) =>
        resolve({ status: Number(error?.code ?? 0), out: out + err }),
      );
    });

  test('ends with 0 and a summary where all is well, and with 1 and a line a fault where it is not', async () => {
    expect(await run()).toEqual({ status: 0, out: '1 model, 2 files, 0 faults\n' });
    damage(page.fileSha256);
    await sql(`UPDATE models SET engine = '0.9.0'`);
    const { status, out } = await run();
    expect(status).toBe(1);
    expect(out.split('\n')).toEqual([
      expect.stringContaining('The upload of picture 1'),
      expect.stringContaining('Model 1 of reading 1 was changed'),
      expect.stringContaining('Reading 1 (Ormsund Cold'),
      '1 model, 2 files, 3 faults',
      '',
    ]);
  });

  test('says where it looked when there is no database', async () => {
    await closeDatabase();
    rmSync(path.join(process.env.COUPLET_DATA!, 'couplet.sqlite'));
    expect(await run()).toMatchObject({ status: 1, out: expect.stringMatching(/^There is no database at .*couplet\.sqlite\./) });
  });
});
