import type { SheetRow } from '@/lib/contracts';

/** Lower case, without accents. */
const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();

/** Whether every word occurs somewhere in what is printed on the sheet or in a module read from it. */
export function matchesWords(row: SheetRow, words: string): boolean {
  const text = plain([row.vendor, row.title, row.number, row.revision, row.dated, ...row.modules].join(' '));
  return plain(words)
    .split(/\s+/)
    .every((word) => text.includes(word));
}
