import { readFileSync } from 'node:fs';
import { beforeAll, expect, inject, test } from 'vitest';
import { operations, type Member, type ModuleView, type SheetView, type UploadAnswer } from '@/lib/contracts';
import type { Operation, OperationName, SessionInfo } from '@/lib/contracts';
import { client, clientOf, newcomer, type Client } from '../support/api';
import { approveModule, emptyReading, finishedReading, must, NOT_STATED, sheetWithChart, take, versionOf } from '../support/approved';
import { heldAnswers } from '../support/contract';
import { draftOf } from '../support/drafts';
import { PASSWORD, PEOPLE } from '../support/people';

const base = inject('baseUrl');
const VENDOR = 'Curlew Thermal';
const REASON = 'The second curve was read along a grid line.';
const page = readFileSync('tests/fixtures/charts/d02.png');

interface Team {
  readonly nobody: Client;
  readonly engineer: Client;
  readonly librarian: Client;
  readonly designer: Client;
  readonly administrator: Client;
  readonly sheet: Awaited<ReturnType<typeof sheetWithChart>>;
  readonly approvedModule: number;
}

let parts = 0;
const stated = () => ({ vendor: VENDOR, partNumber: `Whimbrel ${++parts}` });
const draft = async ({ engineer, sheet }: Team) => (await finishedReading(engineer, sheet, stated())).readingId;

async function handedIn(team: Team): Promise<number> {
  const id = await draft(team);
  await must(await take(team.engineer, id, 'hand-in', { note: 'Both charts.' }));
  return id;
}
async function approved(team: Team): Promise<number> {
  const id = await handedIn(team);
  await must(await take(team.librarian, id, 'approve'));
  return id;
}
async function withdrawn(team: Team): Promise<number> {
  const id = await approved(team);
  await must(await take(team.librarian, id, 'withdraw', { reason: REASON }));
  return id;
}

const newSheet = async ({ engineer }: Team) => must<SheetView>(await engineer.post('/api/sheets', { vendor: VENDOR, number: 'CT-5' }));
const upload = ({ engineer }: Team, { id }: SheetView) => engineer.upload(`/api/sheets/${id}/pages`, page, 'd02.png');
const ifMatch = ({ version }: { version: number }) => ({ 'If-Match': `"${version}"` });
const module = async ({ engineer, approvedModule }: Team) => must<ModuleView>(await engineer.get(`/api/modules/${approvedModule}`));

/** Each call of the API, done as it is meant. */
const CALLS: Record<OperationName, (team: Team) => Promise<Response>> = {
  health: ({ nobody }) => nobody.get('/api/health'),
  describe: ({ nobody }) => nobody.get('/api/openapi.json'),

  signIn: () => client(base).post('/api/session', { email: PEOPLE.both, password: PASSWORD }),
  signOut: async () => (await clientOf(base, 'both')).del('/api/session'),
  me: ({ designer }) => designer.get('/api/me'),
  sessions: ({ designer }) => designer.get('/api/account/sessions'),
  endSession: async () => {
    const person = await newcomer(base, ['designer']);
    const [session] = await must<SessionInfo[]>(await person.get('/api/account/sessions'));
    return person.del(`/api/account/sessions/${session!.id}`);
  },
  changePassword: async () => {
    const person = await newcomer(base, ['designer']);
    return person.post('/api/account/password', { current: person.password, next: 'three unrelated words' });
  },
  today: ({ engineer }) => engineer.get('/api/today'),

  vendors: ({ designer }) => designer.get('/api/vendors'),
  vendor: async (team) => team.designer.get(`/api/vendors/${(await module(team)).vendor.id}`),
  createModule: ({ engineer }) => engineer.post('/api/modules', { ...NOT_STATED, ...stated() }),
  module: ({ designer, approvedModule }) => designer.get(`/api/modules/${approvedModule}`),
  updateModule: async ({ engineer }) => {
    const body = { ...NOT_STATED, ...stated() };
    const made = await must<ModuleView>(await engineer.post('/api/modules', body));
    return engineer.put(`/api/modules/${made.id}`, { ...body, couples: 127 }, ifMatch(made));
  },

  sheets: ({ engineer }) => engineer.get('/api/sheets'),
  createSheet: ({ engineer }) => engineer.post('/api/sheets', { vendor: VENDOR, number: 'CT-4' }),
  sheet: ({ engineer, sheet }) => engineer.get(`/api/sheets/${sheet.sheetId}`),
  updateSheet: async (team) => {
    const sheet = await newSheet(team);
    return team.engineer.put(`/api/sheets/${sheet.id}`, { vendor: VENDOR, number: 'CT-6' }, ifMatch(sheet));
  },
  addPage: async (team) => upload(team, await newSheet(team)),
  removePage: async (team) => {
    const sheet = await newSheet(team);
    const added = await must<UploadAnswer>(await upload(team, sheet));
    return team.engineer.del(`/api/sheets/${sheet.id}/pages/${added.page.id}`);
  },
  startReading: async ({ engineer, sheet }) => {
    const made = await must<ModuleView>(await engineer.post('/api/modules', { ...NOT_STATED, ...stated() }));
    return engineer.post(`/api/sheets/${sheet.sheetId}/readings`, { moduleId: made.id });
  },
  picture: ({ engineer, sheet }) => engineer.get(`/api/pictures/${sheet.picture.id}`),
  thumbnail: ({ engineer, sheet }) => engineer.get(`/api/pictures/${sheet.picture.id}/thumbnail`),
  original: ({ engineer, sheet }) => engineer.get(`/api/pictures/${sheet.picture.id}/original`),

  readings: ({ engineer }) => engineer.get('/api/readings'),
  reading: async (team) => team.engineer.get(`/api/readings/${await draft(team)}`),
  saveReading: async ({ engineer, sheet }) => {
    const { readingId } = await emptyReading(engineer, sheet, stated());
    return engineer.put(`/api/readings/${readingId}`, { document: draftOf(sheet.picture) }, await versionOf(engineer, readingId));
  },
  fitReading: async (team) => team.engineer.post(`/api/readings/${await draft(team)}/model`, { document: draftOf(team.sheet.picture) }),
  handIn: async (team) => take(team.engineer, await draft(team), 'hand-in', { note: 'Both charts.' }),
  takeBack: async (team) => take(team.engineer, await handedIn(team), 'take-back'),
  approve: async (team) => take(team.librarian, await handedIn(team), 'approve'),
  returnReading: async (team) => take(team.librarian, await handedIn(team), 'return', { reason: REASON }),
  withdraw: async (team) => take(team.librarian, await approved(team), 'withdraw', { reason: REASON }),
  restore: async (team) => take(team.librarian, await withdrawn(team), 'restore'),
  review: async (team) => {
    await handedIn(team);
    return team.librarian.get('/api/review');
  },
  evidence: async (team) => team.librarian.get(`/api/readings/${await handedIn(team)}/evidence`),

  mail: async (team) => {
    await handedIn(team);
    return team.administrator.get('/api/mail');
  },
  trail: ({ administrator }) => administrator.get('/api/trail'),
  people: ({ administrator }) => administrator.get('/api/people'),
  addPerson: ({ administrator }) =>
    administrator.post('/api/people', { email: 'wren@kelda.example', name: 'Wren Hollis', roles: ['designer'] }),
  changeRoles: async ({ administrator }) => {
    const { id } = await newcomer(base, ['designer']);
    return administrator.put(`/api/people/${id}/roles`, { roles: ['engineer'] });
  },
  disablePerson: async ({ administrator }) => administrator.post(`/api/people/${(await newcomer(base, ['designer'])).id}/disable`),
  enablePerson: async ({ administrator }) => {
    const { id } = await newcomer(base, ['designer']);
    await must<Member>(await administrator.post(`/api/people/${id}/disable`));
    return administrator.post(`/api/people/${id}/enable`);
  },

  catalogue: ({ designer }) => designer.get('/api/catalogue'),
  moduleModel: ({ designer, approvedModule }) => designer.get(`/api/modules/${approvedModule}/model`),
  duty: ({ designer }) => designer.post('/api/duty', { heatW: 5, coldFaceC: 10, hotFaceC: 30 }),
};

let team: Team;
beforeAll(async () => {
  const [engineer, librarian, designer, administrator] = await Promise.all([
    clientOf(base, 'engineer'),
    clientOf(base, 'librarian'),
    clientOf(base, 'designer'),
    clientOf(base, 'administrator'),
  ]);
  const sheet = await sheetWithChart(engineer, VENDOR, 'CT-3');
  const approvedModule = await approveModule({ engineer, librarian }, sheet, stated());
  team = { nobody: client(base), engineer, librarian, designer, administrator, sheet, approvedModule };
});

test.each(Object.keys(operations) as OperationName[])('%s answers as its description promises', async (name) => {
  const operation: Operation = operations[name];
  const answer = await CALLS[name](team);
  expect(answer.status).toBe(operation.status);
  // the client held it against the description, which says nothing of the items of an empty list
  expect(heldAnswers).toContain(`${operation.method} ${operation.path} ${operation.status}`);
  if (operation.answer) expect(await answer.json()).not.toEqual([]);
});
