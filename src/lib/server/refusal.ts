/** A use case says no: the HTTP status it amounts to and a sentence that says how to go on. */
export class Refusal extends Error {
  constructor(
    readonly status: number,
    readonly kind: string,
    detail: string,
    readonly extra: {
      readonly fields?: Readonly<Record<string, string>>;
      readonly current?: unknown;
      readonly headers?: Readonly<Record<string, string>>;
    } = {},
  ) {
    super(detail);
  }
}

export const notFound = (what: string) => new Refusal(404, 'not-found', `There is no such ${what}, or it is gone.`);
export const notSignedIn = () => new Refusal(401, 'not-signed-in', 'Sign in first; what you were doing is kept.');
export const notAllowed = (detail = 'Your roles do not allow this. An administrator can change them.') =>
  new Refusal(403, 'not-allowed', detail);
export const conflict = (detail: string, kind = 'conflict') => new Refusal(409, kind, detail);
export const wrongInput = (fields: Readonly<Record<string, string>>, detail?: string) =>
  new Refusal(422, 'wrong-input', detail ?? Object.values(fields)[0] ?? 'Something is wrong with what was sent.', { fields });
export const missingVersion = () => new Refusal(428, 'version-missing', 'Say which version you change: send its ETag as If-Match.');
export const lostRace = (current: unknown) =>
  new Refusal(412, 'lost-race', 'Somebody saved another version in the meantime. Compare the two and choose.', { current });
