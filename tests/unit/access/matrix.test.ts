import { expect, test } from 'vitest';
import { can, ROLES, type Access, type Action, type Role } from '@/lib/access';

type Cell = 'yes' | 'no' | 'own' | 'others' | 'approved';

/** The matrix of who may do what, in the order engineer, librarian, designer, administrator. */
const MATRIX: Record<Action, readonly [Cell, Cell, Cell, Cell]> = {
  'account.use': ['yes', 'yes', 'yes', 'yes'],
  'sheet.see': ['yes', 'yes', 'approved', 'approved'],
  'sheet.upload': ['yes', 'yes', 'no', 'no'],
  'sheet.edit': ['yes', 'yes', 'no', 'no'],
  'module.create': ['yes', 'yes', 'no', 'no'],
  'module.edit': ['no', 'yes', 'no', 'no'],
  'reading.see': ['yes', 'yes', 'approved', 'approved'],
  'reading.start': ['yes', 'yes', 'no', 'no'],
  'reading.edit': ['own', 'own', 'no', 'no'],
  'reading.handIn': ['own', 'own', 'no', 'no'],
  'reading.takeBack': ['own', 'own', 'no', 'no'],
  'reading.decide': ['no', 'others', 'no', 'no'],
  'review.see': ['no', 'yes', 'no', 'no'],
  'catalogue.see': ['yes', 'yes', 'yes', 'yes'],
  'duty.search': ['yes', 'yes', 'yes', 'no'],
  'team.manage': ['no', 'no', 'no', 'yes'],
  'trail.see': ['no', 'no', 'no', 'yes'],
  'outbox.see': ['no', 'no', 'no', 'yes'],
};

const ME = 'me';
const OBJECTS: Record<string, Access> = {
  'one’s own draft': { ownerId: ME, editorIds: [ME], approved: false },
  'somebody else’s draft': { ownerId: 'other', editorIds: ['other'], approved: false },
  'an approved one of somebody else': { ownerId: 'other', editorIds: ['other'], approved: true },
  'one that I once edited': { ownerId: 'other', editorIds: ['other', ME], approved: false },
};

const wanted = (cell: Cell, object: Access): boolean => {
  if (cell === 'yes') return true;
  if (cell === 'own') return object.ownerId === ME;
  if (cell === 'others') return object.ownerId !== ME && !object.editorIds?.includes(ME);
  return cell === 'approved' && object.approved === true;
};

const cells = Object.entries(MATRIX).flatMap(([action, row]) =>
  ROLES.flatMap((role, at) =>
    Object.entries(OBJECTS).map(([name, object]) => ({ action: action as Action, role, name, object, cell: row[at] ?? 'no' })),
  ),
);

test.each(cells)('$role, $action, $name: $cell', ({ action, role, object, cell }) => {
  expect(can({ id: ME, roles: [role] }, action, object)).toBe(wanted(cell, object));
});

test('nobody and a person without roles may do nothing', () => {
  for (const action of Object.keys(MATRIX) as Action[]) {
    expect(can(null, action, { ownerId: ME, approved: true })).toBe(false);
    expect(can({ id: ME, roles: [] }, action, { ownerId: ME, approved: true })).toBe(false);
  }
});

test('several roles together may do what any of them may, but never decide on own work', () => {
  const actor = { id: ME, roles: ['engineer', 'librarian'] as Role[] };
  expect(can(actor, 'reading.edit', { ownerId: ME })).toBe(true);
  expect(can(actor, 'reading.decide', { ownerId: 'other', editorIds: [] })).toBe(true);
  expect(can(actor, 'reading.decide', { ownerId: ME, editorIds: [] })).toBe(false);
});

test('without a thing in mind the answer is for the kind of thing, which is what hiding a link needs', () => {
  expect(can({ id: ME, roles: ['librarian'] }, 'reading.decide')).toBe(true);
  expect(can({ id: ME, roles: ['designer'] }, 'sheet.see')).toBe(false);
});
