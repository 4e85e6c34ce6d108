import { describe, expect, it } from 'vitest';
import { found, haystackOf, wordsOf } from '@/lib/server/catalogue/words';

const haystack = haystackOf(['Ormsund Cold', 'Brimstead 40-C', '', 'OC-118']);
const finds = (search: string) => found(haystack, wordsOf(search));

describe('searching the catalogue by words', () => {
  it.each(['brim', '40-c', '40c', 'BRIMSTEAD', 'cold ormsund', 'stead 118', 'oc118', 'd40'])('finds a module by "%s"', (search) => {
    expect(finds(search)).toBe(true);
  });

  it.each(['brimstead 50', 'haff', 'ormsund veltrane', '40-d', 'coldbrim', '+'])('does not find it by "%s"', (search) => {
    expect(finds(search)).toBe(false);
  });

  it('finds everything when nothing is searched for', () => {
    expect(finds('  ')).toBe(true);
  });

  it('does not mind accents or full-width letters', () => {
    expect(found(haystackOf(['Söder Kyla']), wordsOf('soder'))).toBe(true);
    expect(found(haystackOf(['Soder Kyla']), wordsOf('ｓöder'))).toBe(true);
  });
});
