import { readFile, realpath, stat } from 'node:fs/promises';
import path from 'node:path';
import { parseReadingDocument, PictureRefused, read, ReadingRefused, type Picture, type ReadingResult, type Refusal } from '@/lib/reading';
import { intake, IntakeRefused } from '@/lib/server/pictures/intake';

/** `npm run --silent read -- file.reading.json …`: documents to results on standard output; what is refused, one line of JSON each, on standard error. */

const MOST_DOCUMENT_BYTES = 32 * 2 ** 20;
const MOST_PICTURE_BYTES = 256 * 2 ** 20;

/** The whole of an ordinary file, or a sentence on why not. */
async function contentOf(file: string, most: number): Promise<Buffer | string> {
  try {
    const about = await stat(file);
    if (!about.isFile()) return 'is not a file';
    if (about.size > most) return `is larger than ${most / 2 ** 20} MB`;
    return await readFile(file);
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'ENOENT' ? 'is not there' : 'cannot be opened';
  }
}

const isWithin = (folder: string, file: string) => {
  const way = path.relative(folder, file);
  return way !== '' && way !== '..' && !way.startsWith(`..${path.sep}`) && !path.isAbsolute(way);
};

const LEAVES = 'leads out of the folder of the document: keep pictures in that folder and name them from there.';

/** The real path of a picture inside the folder of its document; neither its name nor a link may lead out of it. */
async function pictureFile(folder: string, image: string): Promise<string> {
  if (image.includes('\0') || path.isAbsolute(image) || !isWithin(folder, path.resolve(folder, image)))
    throw new PictureRefused(`The path "${image}" ${LEAVES}`);
  try {
    const [home, file] = await Promise.all([realpath(folder), realpath(path.resolve(folder, image))]);
    if (isWithin(home, file)) return file;
  } catch {
    throw new PictureRefused(`The picture "${image}" is not there: put it in the folder of the document.`);
  }
  throw new PictureRefused(`"${image}" is a link that ${LEAVES}`);
}

async function pictureFrom(folder: string, image: string): Promise<Picture> {
  const content = await contentOf(await pictureFile(folder, image), MOST_PICTURE_BYTES);
  if (typeof content === 'string') throw new PictureRefused(`The picture "${image}" ${content}.`);
  try {
    const { width, height, fileSha256, pixelsSha256, rgb } = await intake(content);
    return { width, height, fileSha256, pixelsSha256, rgb: () => Promise.resolve(rgb) };
  } catch (error) {
    if (error instanceof IntakeRefused) throw new PictureRefused(error.message);
    throw error;
  }
}

function parsedJson(content: Buffer): unknown {
  try {
    return JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(content));
  } catch (error) {
    throw new ReadingRefused('', `This file is not JSON: ${(error as Error).message}.`);
  }
}

async function readDocument(named: string): Promise<ReadingResult> {
  const file = path.resolve(process.env['INIT_CWD'] ?? process.cwd(), named);
  const content = await contentOf(file, MOST_DOCUMENT_BYTES);
  if (typeof content === 'string') throw new ReadingRefused('', `The document ${content}.`);
  const parsed = parseReadingDocument(parsedJson(content));
  if (!parsed.ok) throw new ReadingRefused(parsed.path, parsed.message);
  return read(parsed.document, { picture: (image) => pictureFrom(path.dirname(file), image) });
}

const complain = (document: string, { path: at, message }: Refusal) =>
  process.stderr.write(`${JSON.stringify({ error: { document, path: at, message } })}\n`);

async function main(documents: readonly string[]): Promise<void> {
  if (documents.length === 0) {
    complain('', { path: '', message: 'Name at least one reading document: npm run --silent read -- file.reading.json' });
    process.exitCode = 1;
    return;
  }
  const results: ReadingResult[] = [];
  for (const document of documents) {
    if (process.stderr.isTTY) process.stderr.write(`Reading ${document}\n`);
    try {
      results.push(await readDocument(document));
    } catch (error) {
      if (!(error instanceof ReadingRefused)) throw error;
      complain(document, error);
      process.exitCode = 1;
    }
  }
  if (process.exitCode !== 1) process.stdout.write(`${JSON.stringify(documents.length === 1 ? results[0] : results, null, 1)}\n`);
}

await main(process.argv.slice(2));
