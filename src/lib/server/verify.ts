import {
  approvedModelId,
  latestModel,
  listReadings,
  modelsAfter,
  picturesAfter,
  type ModelRecord,
  type PictureRecord,
  type ReadingRecord,
} from '@db';
import type { BenchDocument } from '@/lib/editor';
import { ENGINE, hashMaterial } from '@/lib/reading';
import { canonicalHash } from './hash';
import { decode } from './pictures/decoder';
import { pixelsSha256 } from './pictures/intake';
import { readKept } from './pictures/store';
import { fitDraft } from './readings';
import { hashOfStored, storedModel } from './review';

/** What was looked at, and a sentence for everything that is not as it was kept. */
export interface Verification {
  readonly models: number;
  readonly files: number;
  readonly faults: readonly string[];
}

const BATCH = 50;

/** Every row of a table, a batch at a time. */
async function* every<T extends { readonly id: number }>(after: (id: number, limit: number) => Promise<T[]>): AsyncGenerator<T> {
  let batch = await after(0, BATCH);
  while (batch.length > 0) {
    yield* batch;
    batch = await after(batch.at(-1)?.id ?? 0, BATCH);
  }
}

/** The work's answer, or the sentence that names what it stumbled over. */
async function attempt<T>(what: string, work: () => Promise<T> | T): Promise<{ ok: true; value: T } | { ok: false; fault: string }> {
  try {
    return { ok: true, value: await work() };
  } catch (error) {
    const missing = (error as NodeJS.ErrnoException).code === 'ENOENT';
    return { ok: false, fault: `${what} ${missing ? 'is gone.' : `cannot be used: ${error instanceof Error ? error.message : error}`}` };
  }
}

const nameOf = (model: ModelRecord) => `Model ${model.id} of reading ${model.readingId}`;

/** The hash of what is stored, and that the very pictures it names are kept. */
async function modelFaults(model: ModelRecord, keptPixels: ReadonlySet<string>): Promise<string[]> {
  const again = await attempt(nameOf(model), () => ({ hash: hashOfStored(model), charts: storedModel(model).result.charts }));
  if (!again.ok) return [again.fault];
  const { hash, charts } = again.value;
  const lost = [...new Set(charts.map((chart) => chart.pixelsSha256))].filter((pixels) => !keptPixels.has(pixels));
  return [
    ...(hash === model.hash ? [] : [`${nameOf(model)} was changed: its hash is ${model.hash}, and what is stored gives ${hash}.`]),
    ...lost.map((pixels) => `${nameOf(model)} stands on a picture that is not kept: pixels ${pixels}.`),
  ];
}

/** The upload and its intake picture, byte by byte, and the pixels that are measured. */
async function pictureFaults(picture: PictureRecord): Promise<string[]> {
  const what = (file: string) => `${file} of picture ${picture.id} (${picture.originalName})`;
  const original = await attempt(what('The upload'), () => readKept(picture.fileSha256));
  const shown = await attempt(what('The intake picture'), async () => {
    const { width, height, samples } = await decode(await readKept(picture.pngSha256), { deep: false, alpha: false });
    return { width, height, pixels: pixelsSha256(width, height, new Uint8Array(samples)) };
  });
  const faults = [original, shown].flatMap((outcome) => (outcome.ok ? [] : [outcome.fault]));
  if (!shown.ok) return faults;
  const { width, height, pixels } = shown.value;
  const same = pixels === picture.pixelsSha256 && width === picture.width && height === picture.height;
  return same ? faults : [...faults, `${what('The intake picture')} does not have the pixels ${picture.pixelsSha256} that were measured.`];
}

/** Reads and fits again what was approved, from its draft and pictures, and compares the whole hash. */
async function readingFaults(reading: ReadingRecord): Promise<string[]> {
  const what = `Reading ${reading.id} (${reading.module.vendor.name} ${reading.module.partNumber}), ${reading.state},`;
  const model = await latestModel(reading.id);
  if (!model) return [`${what} has no model.`];
  if ((await approvedModelId(reading.id)) !== model.id) return [`${what} has model ${model.id}, which is not the one that was approved.`];
  const again = await attempt(what, async () => {
    const { document, result } = storedModel(model);
    const fitted = await fitDraft(reading, JSON.parse(reading.document) as BenchDocument, document.module);
    // Another version of the program may fit otherwise; what was read has to be the same.
    const refitted = model.engine === ENGINE ? (fitted.read?.result.model ?? null) : result.model;
    if (!fitted.document) throw new Error('its draft has no finished chart.');
    const sameDocument = canonicalHash(fitted.document) === canonicalHash(document);
    return { sameDocument, hash: canonicalHash(hashMaterial(fitted.document, fitted.pixelsSha256, refitted, model.engine)) };
  });
  if (!again.ok) return [again.fault];
  if (!again.value.sameDocument) return [`${what} has a draft that is not what was approved.`];
  return again.value.hash === model.hash ? [] : [`${what} gives another model when it is read again from its draft and pictures.`];
}

/**
 * Recomputes everything that an approval rests on: the hash of every model, the SHA-256 of every kept file and of its
 * pixels, and, for whatever is or was approved, the model itself from draft and pictures. Changes nothing.
 */
export async function verify(): Promise<Verification> {
  const faults: string[] = [];
  const files = new Set<string>();
  const keptPixels = new Set<string>();
  for await (const picture of every(picturesAfter)) {
    faults.push(...(await pictureFaults(picture)));
    files.add(picture.fileSha256).add(picture.pngSha256);
    keptPixels.add(picture.pixelsSha256);
  }
  let models = 0;
  for await (const model of every(modelsAfter)) {
    faults.push(...(await modelFaults(model, keptPixels)));
    models += 1;
  }
  for (const reading of (await listReadings({ states: ['approved', 'superseded', 'withdrawn'] })).reverse())
    faults.push(...(await readingFaults(reading)));
  return { models, files: files.size, faults };
}
