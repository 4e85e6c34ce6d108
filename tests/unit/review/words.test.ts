import { expect, test } from 'vitest';
import { objectOf, shortDetail } from '@/components/admin/trail-words';
import { doneSentence } from '@/components/islands/review/decisions';
import { standingReason, whyNotAsked } from '@/components/review/standing';
import type { EvidenceView } from '@/lib/contracts';

const view = (state: string, more: Partial<EvidenceView> = {}, decisions: readonly object[] = []) =>
  ({
    mayDecide: false,
    ownWork: false,
    ...more,
    reading: { state, owner: { id: 'i', name: 'Ilse Marrow' }, decisions },
  }) as unknown as EvidenceView;

test.each([
  ['a librarian with what was handed in', view('handed-in', { mayDecide: true }), true, null],
  ['a librarian with what is approved', view('approved', { mayDecide: true }), true, null],
  ['a librarian with what was withdrawn', view('withdrawn', { mayDecide: true }), true, null],
  [
    'a librarian with own work',
    view('handed-in', { ownWork: true }),
    true,
    'You worked on this reading yourself, so another librarian decides.',
  ],
  [
    'a librarian with own approved work',
    view('approved', { ownWork: true }),
    true,
    'You worked on this reading yourself, so another librarian decides.',
  ],
  ['an engineer with own work', view('handed-in', { ownWork: true }), false, 'It waits for a librarian to decide.'],
  ['a designer', view('approved'), false, 'It is approved. A librarian can withdraw it.'],
  [
    'a librarian with a draft',
    view('draft', { mayDecide: true }),
    true,
    'This is a draft: there is nothing to decide until it is handed in.',
  ],
  ['a librarian with what was returned', view('returned', { mayDecide: true }), true, 'It was returned and is with Ilse Marrow now.'],
  [
    'a librarian with what was superseded',
    view('superseded', { mayDecide: true }),
    true,
    'A newer reading of this module was approved after it, so it stays as it is.',
  ],
])('%s is asked or told why not', (_who, evidence, isLibrarian, sentence) => {
  expect(whyNotAsked(evidence, isLibrarian)).toBe(sentence);
});

test('the reason that stands is that of the state it is in', () => {
  const decisions = [
    { what: 'returned', reason: 'First.' },
    { what: 'handed-in', reason: 'Mended.' },
    { what: 'returned', reason: 'Second.' },
  ];
  expect(standingReason(view('returned', {}, decisions))).toBe('Second.');
  expect(standingReason(view('handed-in', {}, decisions))).toBeNull();
});

test('a restored reading is said to be in the catalogue only where it is', () => {
  expect(doneSentence('restore', 'approved', 'Ilse Marrow')).toContain('in the catalogue again');
  expect(doneSentence('restore', 'superseded', 'Ilse Marrow')).toContain('superseded');
  expect(doneSentence('return', 'returned', 'Ilse Marrow')).toBe('Returned. Ilse Marrow is told why by mail.');
});

test('an entry of the trail leads to the page of its object', () => {
  const at = (object: string, objectName = '') => objectOf({ object, objectName });
  expect(at('reading/12')).toEqual({ text: 'reading 12', href: '/review/12' });
  expect(at('sheet/3')).toEqual({ text: 'sheet 3', href: '/sheets/3' });
  expect(at('module/4')).toEqual({ text: 'module 4', href: '/modules/4' });
  expect(at('person/ab12', 'Wren Hollis')).toEqual({ text: 'Wren Hollis', href: '/admin/team' });
  expect(at('backup/1')).toEqual({ text: 'backup 1', href: null });
  expect(at('')).toEqual({ text: '', href: null });
});

test('a short detail stands in the line, one that holds more is folded up', () => {
  expect(shortDetail({})).toBe('');
  expect(shortDetail({ before: ['designer'], after: ['engineer', 'librarian'] })).toBe('before: designer; after: engineer, librarian');
  expect(shortDetail({ before: { heightMm: 3.6 } })).toBeNull();
  expect(shortDetail({ reason: 'x'.repeat(200) })).toBeNull();
});
