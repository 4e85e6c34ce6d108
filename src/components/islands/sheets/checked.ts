import type { z } from 'zod';

/** A sentence for each field that is wrong; fields are named as the API names them, `ratings[0].hotSideC`. */
export type Problems = Readonly<Record<string, string>>;
export type Checked<Body> = { readonly ok: true; readonly body: Body } | { readonly ok: false; readonly problems: Problems };

const pathName = (path: readonly PropertyKey[]) =>
  path.reduce<string>(
    (name, part) => (typeof part === 'number' ? `${name}[${part}]` : name ? `${name}.${String(part)}` : String(part)),
    '',
  );

/** Holds what was typed against a contract of the API, and against what the form knows beyond it. */
export function checkBy<Schema extends z.ZodType>(schema: Schema, typed: unknown, beyond: Problems = {}): Checked<z.output<Schema>> {
  const parsed = schema.safeParse(typed);
  if (parsed.success && Object.keys(beyond).length === 0) return { ok: true, body: parsed.data };
  const found = parsed.success ? [] : parsed.error.issues.map(({ path, message }) => [pathName(path), message] as const).reverse();
  return { ok: false, problems: { ...Object.fromEntries(found), ...beyond } };
}

/** Whether `field` is `name` or a part of it, `ratings[0].imaxA` of `ratings`. */
export const isPartOf = (field: string, name: string): boolean =>
  field === name || field.startsWith(`${name}.`) || field.startsWith(`${name}[`);

/** The problems without those of some fields. */
export const without = (problems: Problems, names: readonly string[]): Problems =>
  Object.fromEntries(Object.entries(problems).filter(([field]) => !names.some((name) => isPartOf(field, name))));

/** Only the problems of some fields. */
export const only = (problems: Problems, names: readonly string[]): Problems =>
  Object.fromEntries(Object.entries(problems).filter(([field]) => names.some((name) => isPartOf(field, name))));
