const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** Letters and digits only, so that "40c" finds "40-C" and "os 118" finds "OS-118". */
const squeezed = (text: string) => plain(text).replace(/[^\p{L}\p{N}]+/gu, '');

/** What a module is found by: its texts as written and, each on its own, without what stands between letters and digits. */
export const haystackOf = (texts: readonly string[]): string => [...texts.map(plain), ...texts.map(squeezed)].filter(Boolean).join('\n');

/** The words of a search, ready to be looked for; empty when there is nothing to look for. */
export const wordsOf = (search: string): readonly string[] => plain(search).split(/\s+/).filter(Boolean);

/** Whether every word is found, as it stands or squeezed. */
export const found = (haystack: string, words: readonly string[]): boolean =>
  words.every((word) => haystack.includes(word) || (squeezed(word) !== '' && haystack.includes(squeezed(word))));
