import { randomBytes } from 'node:crypto';
import { readFileSync } from 'node:fs';
import http from 'node:http';
import sharp from 'sharp';
import { beforeAll, expect, inject, test } from 'vitest';
import type { SheetRow, SheetView, UploadAnswer, VendorDetail } from '@/lib/contracts';
import { clientOf, type Client } from '../support/api';

const base = inject('baseUrl');
const chart = readFileSync('tests/fixtures/charts/d03.png');

let engineer: Client, designer: Client;
beforeAll(async () => {
  [engineer, designer] = await Promise.all([clientOf(base, 'engineer'), clientOf(base, 'designer')]);
});

async function addSheet(fields: Record<string, string>): Promise<SheetView> {
  const answer = await engineer.post('/api/sheets', { vendor: 'Harrow Cold', ...fields });
  expect(answer.status).toBe(201);
  return (await answer.json()) as SheetView;
}
const upload = async (sheet: SheetView, bytes: Uint8Array, name: string) =>
  (await (await engineer.upload(`/api/sheets/${sheet.id}/pages`, bytes, name)).json()) as UploadAnswer;
const pagesOf = async ({ id }: SheetView) => ((await (await engineer.get(`/api/sheets/${id}`)).json()) as SheetView).pages;
async function addModule(partNumber: string): Promise<number> {
  const sizes = { stages: null, couples: null, coldPlateMm: null, hotPlateMm: null, heightMm: null, maxTemperatureC: null };
  const rest = { leadsOhm: null, sealing: null, acResistanceOhm: null, acResistanceAtC: null, ratings: [] };
  const answer = await engineer.post('/api/modules', { vendor: 'Harrow Cold', partNumber, variant: '', ...sizes, ...rest });
  return ((await answer.json()) as { id: number }).id;
}

test('sheets are found by words of the vendor, the title, the number, or a part read from them', async () => {
  const sheet = await addSheet({ title: 'Teal series', number: 'HC-31', dated: '2024-05' });
  const found = async (words: string) => {
    const rows = (await (await engineer.get(`/api/sheets?q=${encodeURIComponent(words)}`)).json()) as SheetRow[];
    return rows.some((row) => row.id === sheet.id);
  };
  expect(await found('teal harrow')).toBe(true);
  expect(await found('hc-31 2024')).toBe(true);
  expect(await found('teal wigeon')).toBe(false);
  await engineer.post(`/api/sheets/${sheet.id}/readings`, { moduleId: await addModule('Wigeon 8') });
  expect(await found('teal wigeon')).toBe(true);
});

test('a sheet is dated as far as it says, and by a day that exists', async () => {
  expect(await addSheet({ dated: '2024' })).toMatchObject({ dated: '2024' });
  const answer = await engineer.post('/api/sheets', { vendor: 'Harrow Cold', dated: '2024-02-30' });
  expect(answer.status).toBe(422);
  expect(await answer.json()).toMatchObject({ fields: { dated: expect.stringContaining('2026-03-15') } });
});

test('a sheet from which a module is read keeps its vendor', async () => {
  const sheet = await addSheet({ number: 'HC-32' });
  const body = { vendor: 'Other Cold', title: '', number: 'HC-32', revision: '', dated: '', obtainedFrom: '', obtainedOn: '' };
  await engineer.post(`/api/sheets/${sheet.id}/readings`, { moduleId: await addModule('Wigeon 9') });
  const answer = await engineer.put(`/api/sheets/${sheet.id}`, body, { 'If-Match': `"${sheet.version}"` });
  expect(answer.status).toBe(422);
  expect(await answer.json()).toMatchObject({ fields: { vendor: expect.stringContaining('stays Harrow Cold') } });
});

test('a vendor shows its modules to all, and sheets that are not approved to those who read only', async () => {
  const sheet = await addSheet({ number: 'HC-33' });
  const id = await addModule('Wigeon 10');
  const of = async (client: Client) => (await (await client.get(`/api/vendors/${sheet.vendorId}`)).json()) as VendorDetail;
  const [read, designed] = [await of(engineer), await of(designer)];
  expect(read.sheets.map((row) => row.number)).toContain('HC-33');
  expect(read.modules.find((module) => module.id === id)).toMatchObject({ approved: false, mayEdit: true });
  expect(designed.sheets).toEqual([]);
  expect(designed.modules.find((module) => module.id === id)).toMatchObject({ approved: false, mayEdit: false });
});

test('the small copy of a picture is a WebP that is asked for once, by those who may see the picture', async () => {
  const { page } = await upload(await addSheet({}), chart, 'd03.png');
  const path = `${page.picture.url}/thumbnail`;
  const answer = await engineer.get(path);
  expect(answer.headers.get('content-type')).toBe('image/webp');
  expect(await sharp(Buffer.from(await answer.arrayBuffer())).metadata()).toMatchObject({ format: 'webp', width: 480 });
  expect((await engineer.get(path, { 'If-None-Match': answer.headers.get('etag') ?? '' })).status).toBe(304);
  expect((await designer.get(path)).status).toBe(404);
});

test('the same file says on which other sheets it lies', async () => {
  const [first, second] = [await addSheet({ title: 'First' }), await addSheet({ title: 'Second' })];
  const bytes = await sharp({ create: { width: 40, height: 30, channels: 3, background: '#fff' } })
    .png()
    .toBuffer();
  expect((await upload(first, bytes, 'a.png')).already).toEqual([]);
  expect((await upload(second, bytes, 'b.png')).already).toEqual([{ sheetId: first.id, sheet: 'First' }]);
});

/** Sends a whole file and hangs up before the answer. */
function sendAndLeave(path: string, bytes: Uint8Array): Promise<void> {
  const boundary = 'couplet-test';
  const head = `--${boundary}\r\nContent-Disposition: form-data; name="file"; filename="big.png"\r\nContent-Type: image/png\r\n\r\n`;
  const headers = { Origin: base, Cookie: engineer.cookie(), 'Content-Type': `multipart/form-data; boundary=${boundary}` };
  return new Promise((resolve) => {
    const request = http.request(base + path, { method: 'POST', headers });
    request.on('error', () => undefined);
    request.on('close', () => resolve());
    request.end(Buffer.concat([Buffer.from(head), bytes, Buffer.from(`\r\n--${boundary}--\r\n`)]), () => request.destroy());
  });
}

test('whoever hangs up while a picture is taken in gets no page of it', async () => {
  const size = 1600;
  const noise = { raw: { width: size, height: size, channels: 3 } } as const;
  const bytes = await sharp(randomBytes(size * size * 3), noise)
    .png({ compressionLevel: 1 })
    .toBuffer();
  const [left, kept] = [await addSheet({ title: 'Left' }), await addSheet({ title: 'Kept' })];
  await sendAndLeave(`/api/sheets/${left.id}/pages`, bytes);
  // the same work once more, begun later: when it is done, so is the first
  await upload(kept, bytes, 'big.png');
  await upload(kept, await sharp(bytes).negate().png().toBuffer(), 'after.png');
  expect(await pagesOf(kept)).toHaveLength(2);
  expect(await pagesOf(left)).toEqual([]);
});
