import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { closeDatabase, counter, inTransaction, listVendors, migrate, openDatabase, raiseCounter, selfCheck, vendorNamed } from '@db';
import { connection } from '../../db/database';

let folder: string;
beforeEach(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'couplet-db-'));
  await openDatabase(path.join(folder, 'couplet.sqlite'));
  await migrate();
});
afterEach(async () => {
  await closeDatabase();
  rmSync(folder, { recursive: true, force: true });
});

test('the rollback journal, synchronous FULL and foreign keys hold outside and inside a transaction', async () => {
  await expect(selfCheck()).resolves.toMatchObject({ journal: 'delete', synchronous: 2, foreignKeys: 1 });
});

test('the self-check names what is wrong', async () => {
  await connection().query('PRAGMA synchronous = NORMAL');
  await expect(selfCheck()).rejects.toThrow('synchronous is 1, not FULL');
  await connection().query('PRAGMA synchronous = FULL');
  await connection().query('PRAGMA journal_mode = WAL');
  await expect(selfCheck()).rejects.toThrow('journal_mode is wal');
});

test('a second migration has nothing to do', async () => {
  expect(await migrate()).toEqual([]);
});

test('a query inside a transaction belongs to it without being told', async () => {
  await inTransaction(async () => {
    await vendorNamed('Ormsund Cold');
    expect(await listVendors()).toHaveLength(1);
  });
  expect(await listVendors()).toHaveLength(1);
});

test('nothing stays of a transaction that throws', async () => {
  const broken = inTransaction(async () => {
    await vendorNamed('Ormsund Cold');
    await raiseCounter('catalogue');
    throw new Error('broke off');
  });
  await expect(broken).rejects.toThrow('broke off');
  expect(await listVendors()).toEqual([]);
  expect(await counter('catalogue')).toBe(1);
});

test('a transaction in a transaction is refused', async () => {
  await expect(inTransaction(() => inTransaction(async () => undefined))).rejects.toThrow('Already in a transaction');
});

test('fifty transactions at once all happen, one after the other', async () => {
  await Promise.all(
    Array.from({ length: 50 }, (_, n) => inTransaction(() => vendorNamed(`Vendor ${n % 10}`).then(() => raiseCounter('catalogue')))),
  );
  expect(await listVendors()).toHaveLength(10);
  expect(await counter('catalogue')).toBe(51);
});

test('a lock held by another process for a while is waited for', async () => {
  const file = path.join(folder, 'couplet.sqlite');
  const holder = spawn(
    process.execPath,
    [
      '-e',
      `const { Database } = require('sqlite3'); const db = new Database(process.argv[1]);
       db.exec('BEGIN IMMEDIATE', () => { console.log('held'); setTimeout(() => db.exec('COMMIT', () => db.close()), 1200); });`,
      file,
    ],
    { stdio: ['ignore', 'pipe', 'inherit'] },
  );
  await new Promise((resolve) => holder.stdout.once('data', resolve));
  await inTransaction(() => raiseCounter('catalogue'));
  expect(await counter('catalogue')).toBe(2);
});

test('a row that names something gone is refused', async () => {
  await expect(
    connection().query(`INSERT INTO modules (vendor_id, part_number, created_at, updated_at) VALUES (99, 'x', '', '')`),
  ).rejects.toThrow(/FOREIGN KEY/i);
});
