import { spawn } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { ReadingResult } from '@/lib/reading';
import { intake } from '@/lib/server/pictures/intake';
import { clickedDocument } from '../../support/charts';

const ROOT = fileURLToPath(new URL('../../..', import.meta.url));
const CHARTS = path.join(ROOT, 'tests/fixtures/charts');

interface Run {
  readonly status: number | null;
  readonly out: string;
  readonly errors: readonly string[];
}

/** The command as npm runs it: in the folder of the project, told the caller's folder by INIT_CWD. */
function run(folder: string, ...documents: string[]): Promise<Run> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, ['--import', 'tsx', 'scripts/read.ts', ...documents], {
      cwd: ROOT,
      env: { ...process.env, INIT_CWD: folder },
    });
    let [out, errors] = ['', ''];
    child.stdout.on('data', (chunk: Buffer) => (out += chunk.toString()));
    child.stderr.on('data', (chunk: Buffer) => (errors += chunk.toString()));
    child.on('error', reject);
    child.on('close', (status) => resolve({ status, out, errors: errors.split('\n').filter((line) => line !== '') }));
  });
}

const result = ({ out }: Run) => JSON.parse(out) as ReadingResult;
const refusals = ({ errors }: Run) =>
  errors.map((line) => (JSON.parse(line) as { error: { document: string; path: string; message: string } }).error);

let folder: string;
const clicked = clickedDocument(['d01', 'd03'], { count: 8, scatterPx: 0.5, seed: 7 });
const write = (name: string, content: unknown) =>
  writeFileSync(path.join(folder, name), typeof content === 'string' ? content : JSON.stringify(content));
const withImage = (image: string) => ({ ...clicked, charts: clicked.charts.map((chart) => ({ ...chart, image })) });

beforeAll(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'couplet-read-'));
  mkdirSync(path.join(folder, 'sheet/charts'), { recursive: true });
  for (const name of ['d01.png', 'd03.png']) cpSync(path.join(CHARTS, name), path.join(folder, 'sheet', name));
  cpSync(path.join(CHARTS, 'd01.png'), path.join(folder, 'sheet/charts/d01.png'));
  cpSync(path.join(CHARTS, 'd01.png'), path.join(folder, 'outside.png'));
  symlinkSync(path.join(folder, 'outside.png'), path.join(folder, 'sheet/link-out.png'));
  symlinkSync(folder, path.join(folder, 'sheet/up'));
  symlinkSync('d01.png', path.join(folder, 'sheet/link-in.png'));
  write('sheet/both.reading.json', clicked);
  write('sheet/deep.reading.json', withImage('charts/d01.png'));
  write('sheet/link-in.reading.json', withImage('link-in.png'));
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

describe('the command', () => {
  it('prints one result for one document, named from the folder of the caller', async () => {
    const done = await run(path.join(folder, 'sheet'), 'both.reading.json');
    expect(done).toMatchObject({ status: 0, errors: [] });
    const read = result(done);
    expect(read.format).toBe('couplet.result');
    expect(read.charts.map(({ image }) => image)).toEqual(['d01.png', 'd03.png']);
    expect(read.model!.rmsPercentOfQmax).toBeLessThan(1.5);
  });

  it('hashes the picture as intake does', async () => {
    const { readFileSync } = await import('node:fs');
    const { fileSha256, pixelsSha256 } = await intake(readFileSync(path.join(CHARTS, 'd03.png')));
    expect(result(await run(folder, 'sheet/both.reading.json')).charts[1]).toMatchObject({ fileSha256, pixelsSha256 });
  });

  it('prints the same bytes for the same input', async () => {
    const [one, other] = await Promise.all([
      run(folder, 'sheet/both.reading.json'),
      run(path.join(folder, 'sheet'), './both.reading.json'),
    ]);
    expect(one.out).toBe(other.out);
    expect(one.out.length).toBeGreaterThan(1000);
  });

  it('prints an array in the same order for several documents, pictures in folders below and links that stay inside included', async () => {
    const done = await run(folder, 'sheet/deep.reading.json', 'sheet/both.reading.json', 'sheet/link-in.reading.json');
    expect(done.status).toBe(0);
    const images = (JSON.parse(done.out) as ReadingResult[]).map(({ charts }) => charts[0]!.image);
    expect(images).toEqual(['charts/d01.png', 'd01.png', 'link-in.png']);
  });

  it('prints nothing but one line of JSON for each refused document when one is refused', async () => {
    write('sheet/odd.reading.json', { ...clicked, charts: [{ ...clicked.charts[0], colour: 'red' }] });
    write('sheet/start.reading.json', { ...clicked, charts: [{ ...clicked.charts[0], curves: [{ value: 1, start: [820, 150] }] }] });
    const done = await run(folder, 'sheet/odd.reading.json', 'sheet/both.reading.json', 'sheet/start.reading.json');
    expect(done).toMatchObject({ status: 1, out: '' });
    expect(refusals(done)).toEqual([
      { document: 'sheet/odd.reading.json', path: 'charts[0].colour', message: expect.stringContaining('no key "colour"') },
      {
        document: 'sheet/start.reading.json',
        path: 'charts[0].curves[0].start',
        message: expect.stringContaining('no line within 6 pixels of 820.0, 150.0'),
      },
    ]);
    expect(Object.keys(JSON.parse(done.errors[0]!) as object)).toEqual(['error']);
  });

  it('refuses what is no document', async () => {
    write('text.json', 'I; Qc');
    write('empty.json', '');
    write('latin.json', Buffer.from([0x22, 0xff, 0x22]).toString('latin1'));
    const done = await run(folder, 'text.json', 'empty.json', 'nowhere.json', 'sheet');
    expect(done).toMatchObject({ status: 1, out: '' });
    expect(refusals(done).map(({ document, path: at }) => [document, at])).toEqual([
      ['text.json', ''],
      ['empty.json', ''],
      ['nowhere.json', ''],
      ['sheet', ''],
    ]);
    expect(refusals(done).map(({ message }) => message)).toEqual([
      expect.stringMatching(/^This file is not JSON/),
      expect.stringMatching(/^This file is not JSON/),
      'The document is not there.',
      'The document is not a file.',
    ]);
  });

  it('asks for a document when none is named', async () => {
    const done = await run(folder);
    expect(done).toMatchObject({ status: 1, out: '' });
    expect(refusals(done)[0]!.message).toMatch(/Name at least one reading document/);
  });
});

describe('a picture of a document', () => {
  const bad: [string, RegExp][] = [
    ['../outside.png', /leads out of the folder of the document/],
    ['charts/../../outside.png', /leads out of the folder/],
    ['link-out.png', /is a link that leads out of the folder/],
    ['up/outside.png', /is a link that leads out of the folder/],
    ['/etc/hostname', /leads out of the folder/],
    ['.', /leads out of the folder/],
    ['d01.png\0', /leads out of the folder/],
    ['missing.png', /"missing\.png" is not there/],
    ['charts', /is not a file/],
    ['both.reading.json', /not a picture/],
  ];

  it('that leaves its folder, is not there or is no picture is refused at the image', async () => {
    const names = bad.map(([image], at) => {
      write(`sheet/bad-${at}.reading.json`, withImage(image));
      return `sheet/bad-${at}.reading.json`;
    });
    const done = await run(folder, ...names);
    expect(done).toMatchObject({ status: 1, out: '' });
    const refused = refusals(done);
    expect(refused.map(({ document }) => document)).toEqual(names);
    for (const [at, [image, message]] of bad.entries()) {
      expect(refused[at]!.path, image).toBe('charts[0].image');
      expect(refused[at]!.message, image).toMatch(message);
    }
  });
});
