import { expect, test } from 'vitest';
import type { SheetRow } from '@/lib/contracts';
import { matchesWords } from '@/lib/server/sheets/search';

const row: SheetRow = {
  id: 1,
  vendorId: 1,
  vendor: 'Sélune Frío',
  title: 'Brimstead series',
  number: 'OC-118',
  revision: 'B',
  dated: '2026-03',
  pages: 2,
  readings: 1,
  modules: ['Brimstead 40-C sealed'],
  createdAt: '2026-11-12T10:00:00.000Z',
};

test.each(['', 'brim', 'oc-118', 'SERIES brimstead', 'selune', '2026-03', '40-c sealed', '  oc   series '])('“%s” finds it', (words) => {
  expect(matchesWords(row, words)).toBe(true);
});

test.each(['brim oc-119', 'seriesbrimstead', '2025'])('“%s” does not', (words) => {
  expect(matchesWords(row, words)).toBe(false);
});
