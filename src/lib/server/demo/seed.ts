import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { findPerson } from '@db';
import { fromReadingDocument, type BenchDocument, type BenchPicture } from '@/lib/editor';
import { parseReadingDocument, type ReadingDocument } from '@/lib/reading';
import { addModule } from '../parts';
import type { SignedInPerson } from '../people';
import { readingView, saveReading, startReading } from '../readings';
import { approve, handIn, returnToOwner, withdraw } from '../review';
import { addSheet, uploadPage } from '../sheets';
import { parseManifest, type SamplesManifest } from './manifest';
import { DEMO_PEOPLE, demoPersonId, type DemoPerson } from './people';

type Sample = SamplesManifest['readings'][number];

interface Shelf {
  readonly sheetId: number;
  /** Pictures by the file name that reading documents use. */
  readonly pictures: ReadonlyMap<string, BenchPicture>;
}

interface Stock {
  readonly folder: string;
  readonly shelves: ReadonlyMap<string, Shelf>;
  readonly modules: ReadonlyMap<string, number>;
}

async function demoPerson(email: string): Promise<SignedInPerson> {
  const known = DEMO_PEOPLE.find((person) => person.email === email);
  const record = known && (await findPerson(demoPersonId(known as DemoPerson)));
  if (!record) throw new Error(`The demo person ${email} is missing.`);
  return { id: record.id, email: record.email, name: record.name, roles: record.roles };
}

async function fillShelf(actor: SignedInPerson, folder: string, { sheet, pages }: SamplesManifest['sheets'][number]): Promise<Shelf> {
  const { id: sheetId } = await addSheet(actor, sheet);
  const pictures = new Map<string, BenchPicture>();
  for (const page of pages) {
    const name = path.basename(page.file);
    const { page: made } = await uploadPage(actor, sheetId, { name, bytes: await readFile(path.join(folder, page.file)) });
    pictures.set(name, made.picture);
  }
  return { sheetId, pictures };
}

async function stockUp(actor: SignedInPerson, folder: string, manifest: SamplesManifest): Promise<Stock> {
  const shelves = new Map<string, Shelf>();
  for (const sheet of manifest.sheets) shelves.set(sheet.slug, await fillShelf(actor, folder, sheet));
  const modules = new Map<string, number>();
  for (const { slug, module } of manifest.modules) modules.set(slug, (await addModule(actor, module)).id);
  return { folder, shelves, modules };
}

async function draftOf(stock: Stock, sample: Sample): Promise<BenchDocument> {
  const parsed = parseReadingDocument(JSON.parse(await readFile(path.join(stock.folder, sample.file), 'utf8')));
  if (!parsed.ok) throw new Error(`${sample.file}, ${parsed.path}: ${parsed.message}`);
  const pictures = stock.shelves.get(sample.sheet)?.pictures;
  const imported = fromReadingDocument(parsed.document satisfies ReadingDocument, (image) => pictures?.get(image) ?? null);
  if (!imported.ok) throw new Error(`${sample.file}: ${imported.message}`);
  return imported.document;
}

/** Makes a draft of a sample, as `change` leaves it, and answers its number and version. */
async function makeDraft(owner: SignedInPerson, stock: Stock, sample: Sample, change = (draft: BenchDocument) => draft) {
  const [sheetId, moduleId] = [stock.shelves.get(sample.sheet)?.sheetId, stock.modules.get(sample.module)];
  if (sheetId === undefined || moduleId === undefined) throw new Error(`${sample.file} names a sheet or module that is not there.`);
  const id = await startReading(owner, sheetId, moduleId);
  const { version } = await saveReading(owner, id, (await readingView(owner, id)).version, change(await draftOf(stock, sample)));
  return { id, version };
}

async function makeHandedIn(
  owner: SignedInPerson,
  stock: Stock,
  sample: Sample,
  note: string,
  change?: (draft: BenchDocument) => BenchDocument,
) {
  const { id, version } = await makeDraft(owner, stock, sample, change);
  return { id, version: (await handIn(owner, id, version, note)).version };
}

async function makeApproved(
  owner: SignedInPerson,
  librarian: SignedInPerson,
  stock: Stock,
  sample: Sample,
  change?: (draft: BenchDocument) => BenchDocument,
) {
  const { id, version } = await makeHandedIn(owner, stock, sample, '', change);
  return { id, version: (await approve(librarian, id, version)).version };
}

/** Every other point of each curve: a hastier reading of the same charts. */
const hasty = (draft: BenchDocument): BenchDocument => ({
  ...draft,
  charts: draft.charts.map((chart) => ({
    ...chart,
    curves: chart.curves.map((curve) => ({ ...curve, points: curve.points.filter((_, at) => at % 2 === 0), omitted: [] })),
  })),
});

/** The last chart is framed, its curves are still to be read. */
const halfDone = (draft: BenchDocument): BenchDocument => ({
  ...draft,
  charts: draft.charts.map((chart, at) => (at === draft.charts.length - 1 ? { ...chart, curves: [] } : chart)),
});

const RETURN_REASON = 'The curve of the highest current leaves its line near the middle of the chart. Please place those points again.';
const WITHDRAW_REASON = 'The vendor has recalled this sheet: its curves belong to another height of the module.';

/**
 * Brings the samples in through the use cases that people use: uploads, modules, readings, decisions. All are approved, and beside
 * them there is one reading in every other state.
 */
export async function seedSamples(folder: string): Promise<void> {
  const manifest = parseManifest(await readFile(path.join(folder, 'manifest.json'), 'utf8'));
  const [ilse, petra, soren] = await Promise.all(['ilse@kelda.example', 'petra@kelda.example', 'soren@kelda.example'].map(demoPerson));
  if (!ilse || !petra || !soren) return;
  const stock = await stockUp(ilse, folder, manifest);
  const [first, second, third, fourth, ...others] = manifest.readings;
  const last = others.pop();
  if (!first || !second || !third || !fourth || !last) throw new Error('The samples hold too few readings for the demo.');

  await makeApproved(ilse, soren, stock, first, hasty);
  for (const [at, sample] of [first, second, third, fourth, ...others].entries())
    await makeApproved(at % 4 === 3 ? petra : ilse, soren, stock, sample);
  const recalled = await makeApproved(petra, soren, stock, last);
  await withdraw(soren, recalled.id, recalled.version, WITHDRAW_REASON);

  const returned = await makeHandedIn(ilse, stock, second, 'Read again with more points.', hasty);
  await returnToOwner(soren, returned.id, returned.version, RETURN_REASON);
  await makeHandedIn(petra, stock, third, 'The voltage chart of the new revision, read anew.', hasty);
  await makeDraft(ilse, stock, fourth, halfDone);
}
