import { IntakeRefused } from './refused';

export type MediaType = 'image/png' | 'image/jpeg' | 'image/webp' | 'image/tiff' | 'image/gif';

const ALLOWED = 'PNG, JPEG, WebP, TIFF or GIF';

const latin = (bytes: Uint8Array, from: number, length: number) => Buffer.from(bytes.subarray(from, from + length)).toString('latin1');

function allowedKind(bytes: Uint8Array): MediaType | null {
  const head = latin(bytes, 0, 12);
  if (head.startsWith('\x89PNG\r\n\x1a\n')) return 'image/png';
  if (head.startsWith('\xff\xd8\xff')) return 'image/jpeg';
  if (head.startsWith('RIFF') && head.endsWith('WEBP')) return 'image/webp';
  if (head.startsWith('II*\0') || head.startsWith('MM\0*')) return 'image/tiff';
  if (head.startsWith('GIF87a') || head.startsWith('GIF89a')) return 'image/gif';
  return null;
}

/** Kinds that people do send and that are never decoded here. */
function otherKind(bytes: Uint8Array): string | null {
  const head = latin(bytes, 0, 1024);
  if (head.includes('%PDF-')) return 'a PDF document';
  if (/<svg[\s>]/i.test(head)) return 'an SVG drawing';
  if (head.slice(4, 8) === 'ftyp') return /^(?:avif|avis)/.test(head.slice(8)) ? 'an AVIF picture' : 'a HEIF picture or a film';
  if (head.startsWith('BM')) return 'a BMP picture';
  if (head.startsWith('8BPS')) return 'a PSD file';
  if (head.startsWith('PK\x03\x04')) return 'a ZIP archive or an office document';
  return null;
}

/** The kind of a file by its first bytes; its name and the type it came with are no evidence. Throws IntakeRefused for everything but the five allowed kinds. */
export function kindOf(bytes: Uint8Array): MediaType {
  if (bytes.length === 0) throw new IntakeRefused('empty', 'The file is empty. Choose it again.');
  const kind = allowedKind(bytes);
  if (kind) return kind;
  const other = otherKind(bytes);
  if (other) throw new IntakeRefused('unsupported-kind', `This is ${other}. Save the chart as ${ALLOWED} and send that.`);
  throw new IntakeRefused('not-an-image', `This file is not a picture. Send the chart as ${ALLOWED}.`);
}
