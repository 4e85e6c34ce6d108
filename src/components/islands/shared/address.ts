/** What an address holds: names and texts, never an empty one. */
export type Texts = Readonly<Record<string, string>>;

const filled = (entries: Iterable<readonly [string, unknown]>): Texts =>
  Object.fromEntries(
    [...entries].flatMap(([name, value]) => (typeof value === 'string' && value.trim() !== '' ? [[name, value.trim()]] : [])),
  );

/** The texts of an address. */
export const textsOf = (search: string): Texts => filled(new URLSearchParams(search));

/** What stands in a form, by the names of its fields. */
export const formTexts = (form: HTMLFormElement): Texts => filled([...new FormData(form)]);

/** The address of a page that holds these texts; `changes` to undefined or nothing leave a name out. */
export function addressOf(path: string, texts: Texts, changes: Readonly<Record<string, string | undefined>> = {}): string {
  const search = new URLSearchParams(filled(Object.entries({ ...texts, ...changes }))).toString();
  return search === '' ? path : `${path}?${search}`;
}

/** Whether two sets of texts say the same, in whatever order. */
export const sameTexts = (a: Texts, b: Texts): boolean =>
  Object.keys(a).length === Object.keys(b).length && Object.entries(a).every(([name, text]) => b[name] === text);

/** A plain press of the main button, which a page may answer itself; anything else opens a tab or window as usual. */
export const isPlainClick = (event: { button: number; metaKey: boolean; ctrlKey: boolean; shiftKey: boolean; altKey: boolean }): boolean =>
  event.button === 0 && !event.metaKey && !event.ctrlKey && !event.shiftKey && !event.altKey;
