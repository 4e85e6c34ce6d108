import { hash, verify, type Options } from '@node-rs/argon2';
import pLimit from 'p-limit';

// Algorithm is a const enum: under isolatedModules write 2 (Argon2id). OWASP's floor: 19 MiB, two passes, one lane.
const ARGON2ID: Options = { algorithm: 2, memoryCost: 19456, timeCost: 2, parallelism: 1 };

/** Each hash holds 19 MiB: so many at once and no more; the rest wait their turn. */
const PARALLEL_HASHES = 2;
const inTurn = pLimit(PARALLEL_HASHES);

export const hashPassword = (password: string): Promise<string> => inTurn(() => hash(password, ARGON2ID));

/** The hash of no password: verifying against it costs the same as against a real one. */
let noPassword: Promise<string> | undefined;

export const verifyPassword = async (passwordHash: string | null, password: string): Promise<boolean> => {
  const known = passwordHash ?? (await (noPassword ??= hashPassword('\u0000no password')));
  return (await inTurn(() => verify(known, password))) && passwordHash !== null;
};
