import { createHash } from 'node:crypto';
import canonicalize from 'canonicalize';

export const sha256 = (bytes: string | Uint8Array) => createHash('sha256').update(bytes).digest('hex');

/** SHA-256 of the RFC 8785 form of a JSON value. */
export function canonicalHash(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new Error('Only JSON has a canonical form.');
  return sha256(text);
}
