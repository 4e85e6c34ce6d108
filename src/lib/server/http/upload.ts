import type { IncomingMessage, ServerResponse } from 'node:http';
import { Readable } from 'node:stream';
import type { ReadableStream as WebStream } from 'node:stream/web';
import multer from 'multer';
import { fileTooLarge } from '@/lib/contracts';
import { Refusal } from '../refusal';

export interface UploadedFile {
  readonly name: string;
  readonly bytes: Buffer;
}

type MulterRequest = IncomingMessage & { file?: Express.Multer.File };

const ENVELOPE_BYTES = 64 * 1024;
const LONGEST_NAME = 200;

const tooLarge = (limit: number) => new Refusal(413, 'too-large', fileTooLarge(limit));

/** Reads one file, in the field `file`, from a multipart request through multer; refuses in sentences. */
export async function readUpload(request: Request, maxBytes: number): Promise<UploadedFile> {
  const type = request.headers.get('content-type') ?? '';
  if (!type.toLowerCase().startsWith('multipart/form-data') || !request.body)
    throw new Refusal(415, 'not-multipart', 'Send the file as multipart/form-data, in the field "file".');
  // an honest Content-Length lets us refuse before reading anything
  if (Number(request.headers.get('content-length') ?? 0) > maxBytes + ENVELOPE_BYTES) {
    await request.body.cancel().catch(() => undefined);
    throw tooLarge(maxBytes);
  }
  const incoming = asIncoming(request);
  await runMulter(incoming, maxBytes);
  if (!incoming.file || incoming.file.size === 0)
    throw new Refusal(422, 'no-file', 'No file came with this, or it is empty. Choose a picture and send it again.');
  return { name: cleanName(incoming.file.originalname), bytes: incoming.file.buffer };
}

function asIncoming(request: Request): MulterRequest {
  const headers: Record<string, string> = {};
  request.headers.forEach((value, name) => (headers[name] = value));
  // multer only looks at requests that announce a body
  if (!headers['content-length']) headers['transfer-encoding'] ??= 'chunked';
  return Object.assign(Readable.fromWeb(request.body as WebStream), { headers, method: request.method }) as unknown as MulterRequest;
}

function runMulter(incoming: MulterRequest, maxBytes: number): Promise<void> {
  const receive = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maxBytes, files: 1, fields: 4, parts: 5, fieldSize: 1024, fieldNameSize: 60, headerPairs: 30 },
    defParamCharset: 'utf8',
  }).single('file');
  return new Promise((resolve, reject) => {
    receive(incoming as never, {} as ServerResponse as never, (error: unknown) => {
      if (!error) return resolve();
      if (error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE') return reject(tooLarge(maxBytes));
      return reject(new Refusal(400, 'broken-upload', 'The upload broke off or is malformed. Send the file again.'));
    });
  });
}

/** The last part of a file name, without control characters: shown to people, never used as a path. */
const cleanName = (name: string) =>
  (name.split(/[\\/]/).at(-1) ?? '')
    .replace(/\p{Cc}/gu, '')
    .trim()
    .slice(-LONGEST_NAME) || 'picture';
