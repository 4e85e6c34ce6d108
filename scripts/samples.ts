import { mkdir, readFile, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { manifestOf, pathOf } from '../samples/draw/manifest';
import { drawSheet, toJson, type DrawnSheet } from '../samples/draw/sheet';
import { sheets, vendors } from '../samples/plan';

/** `npm run samples`: draws every sheet of `samples/` again, writes its readings and the manifest, and measures how well they read. */

const samples = fileURLToPath(new URL('../samples/', import.meta.url));

async function keep(sheet: DrawnSheet): Promise<number> {
  await mkdir(path.join(samples, 'sheets', sheet.plan.slug), { recursive: true });
  const texts = sheet.readings.map(({ name, document }) => ({ name, bytes: Buffer.from(toJson(document)) }));
  const files = [...sheet.pictures, ...texts];
  for (const { name, bytes } of files) await writeFile(path.join(samples, pathOf(sheet, name)), bytes);
  return sheet.pictures.reduce((sum, { bytes }) => sum + bytes.byteLength, 0);
}

const TABLE = /(<!-- misfit: written by `npm run samples` -->\n)[^]*?(\n<!-- end of misfit -->)/;

async function draw(): Promise<DrawnSheet[]> {
  const drawn: DrawnSheet[] = [];
  let bytes = 0;
  for (const plan of sheets) {
    const sheet = await drawSheet(plan);
    bytes += await keep(sheet);
    drawn.push(sheet);
    console.log(`${plan.slug}: ${sheet.pictures.length} pictures, ${sheet.readings.length} readings`);
  }
  console.log(`${(bytes / 1e6).toFixed(2)} MB of pictures`);
  return drawn;
}

/** Imported only once everything is drawn: the intake of pictures forbids sharp to open SVG from then on. */
async function measure(drawn: readonly DrawnSheet[]): Promise<string> {
  const { misfitOf, misfitTable } = await import('../samples/draw/misfit');
  const misfits = [];
  for (const sheet of drawn) for (const reading of sheet.readings) misfits.push(await misfitOf(sheet, reading));
  return misfitTable(misfits);
}

async function main(): Promise<void> {
  await rm(path.join(samples, 'sheets'), { recursive: true, force: true });
  const drawn = await draw();
  await writeFile(path.join(samples, 'manifest.json'), toJson(manifestOf(vendors, drawn)));
  const table = await measure(drawn);
  const readme = path.join(samples, 'README.md');
  const text = await readFile(readme, 'utf8');
  await writeFile(
    readme,
    text.replace(TABLE, (_, start: string, end: string) => start + table + end),
  );
}

await main();
