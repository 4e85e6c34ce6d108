import { z } from 'zod';
import { idParams, rowId } from './common';
import { operation } from './operation';
import {
  moduleBody,
  moduleView,
  pageParams,
  sheetBody,
  sheetRow,
  sheetView,
  startReadingBody,
  uploadAnswer,
  vendorView,
} from './parts';
import { changePasswordBody, person, sessionInfo, signInBody } from './people';
import {
  emptyBody,
  handInBody,
  modelAnswer,
  modelBody,
  readingRow,
  readingView,
  returnBody,
  saveAnswer,
  saveBody,
  stateAnswer,
} from './readings';

const made = z.strictObject({ id: rowId });

/** Every call of the API. A file under src/pages/api without its calls here fails a test. */
export const operations = {
  health: operation({ method: 'GET', path: '/api/health', tag: 'service', summary: 'Is the server up', may: 'open', status: 200, answer: z.strictObject({ ok: z.literal(true) }) }),
  describe: operation({ method: 'GET', path: '/api/openapi.json', tag: 'service', summary: 'This description, OpenAPI 3.1', may: 'open', status: 200, answer: z.looseObject({}) }),

  signIn: operation({ method: 'POST', path: '/api/session', tag: 'account', summary: 'Sign in', may: 'open', body: signInBody, status: 200, answer: person, problems: [401, 429] }),
  signOut: operation({ method: 'DELETE', path: '/api/session', tag: 'account', summary: 'Sign out', may: 'account.use', status: 204 }),
  me: operation({ method: 'GET', path: '/api/me', tag: 'account', summary: 'Who is signed in', may: 'account.use', status: 200, answer: person }),
  sessions: operation({ method: 'GET', path: '/api/account/sessions', tag: 'account', summary: 'One’s own sessions', may: 'account.use', status: 200, answer: z.array(sessionInfo) }),
  endSession: operation({ method: 'DELETE', path: '/api/account/sessions/{id}', tag: 'account', summary: 'End one of one’s own sessions', may: 'account.use', params: z.strictObject({ id: z.string().min(1).max(64) }), status: 204 }),
  changePassword: operation({ method: 'POST', path: '/api/account/password', tag: 'account', summary: 'Change one’s password; other sessions end', may: 'account.use', body: changePasswordBody, status: 204 }),

  vendors: operation({ method: 'GET', path: '/api/vendors', tag: 'modules', summary: 'Vendors', may: 'catalogue.see', status: 200, answer: z.array(vendorView) }),
  createModule: operation({ method: 'POST', path: '/api/modules', tag: 'modules', summary: 'Add a module as printed', may: 'module.create', body: moduleBody, status: 201, answer: moduleView, problems: [409] }),
  module: operation({ method: 'GET', path: '/api/modules/{id}', tag: 'modules', summary: 'A module: identity and ratings as printed', may: 'catalogue.see', params: idParams, status: 200, answer: moduleView }),
  updateModule: operation({ method: 'PUT', path: '/api/modules/{id}', tag: 'modules', summary: 'Change identity and ratings', may: 'module.create', params: idParams, body: moduleBody, ifMatch: true, status: 200, answer: moduleView, problems: [409] }),

  sheets: operation({ method: 'GET', path: '/api/sheets', tag: 'sheets', summary: 'Sheets', may: 'sheet.upload', status: 200, answer: z.array(sheetRow) }),
  createSheet: operation({ method: 'POST', path: '/api/sheets', tag: 'sheets', summary: 'Add a sheet', may: 'sheet.upload', body: sheetBody, status: 201, answer: sheetView }),
  sheet: operation({ method: 'GET', path: '/api/sheets/{id}', tag: 'sheets', summary: 'A sheet with its pages', may: 'catalogue.see', params: idParams, status: 200, answer: sheetView }),
  updateSheet: operation({ method: 'PUT', path: '/api/sheets/{id}', tag: 'sheets', summary: 'Change what a sheet is', may: 'sheet.edit', params: idParams, body: sheetBody, ifMatch: true, status: 200, answer: sheetView }),
  addPage: operation({ method: 'POST', path: '/api/sheets/{id}/pages', tag: 'sheets', summary: 'Upload a picture as the next page', may: 'sheet.upload', params: idParams, multipart: true, status: 201, answer: uploadAnswer, problems: [413, 415, 503] }),
  removePage: operation({ method: 'DELETE', path: '/api/sheets/{id}/pages/{page}', tag: 'sheets', summary: 'Take a page off a sheet', may: 'sheet.edit', params: pageParams, status: 204, problems: [409] }),
  startReading: operation({ method: 'POST', path: '/api/sheets/{id}/readings', tag: 'readings', summary: 'Start a reading of a module from this sheet', may: 'reading.start', params: idParams, body: startReadingBody, status: 201, answer: made }),
  picture: operation({ method: 'GET', path: '/api/pictures/{id}', tag: 'sheets', summary: 'The intake picture that is shown and measured', may: 'catalogue.see', params: idParams, status: 200, media: 'image/png' }),
  original: operation({ method: 'GET', path: '/api/pictures/{id}/original', tag: 'sheets', summary: 'The file as it was uploaded', may: 'catalogue.see', params: idParams, status: 200, media: 'application/octet-stream' }),

  readings: operation({ method: 'GET', path: '/api/readings', tag: 'readings', summary: 'One’s own readings', may: 'reading.start', status: 200, answer: z.array(readingRow) }),
  reading: operation({ method: 'GET', path: '/api/readings/{id}', tag: 'readings', summary: 'A reading with its draft', may: 'catalogue.see', params: idParams, status: 200, answer: readingView }),
  saveReading: operation({ method: 'PUT', path: '/api/readings/{id}', tag: 'readings', summary: 'Save the draft', may: 'reading.edit', params: idParams, body: saveBody, ifMatch: true, status: 200, answer: saveAnswer, problems: [409] }),
  fitReading: operation({ method: 'POST', path: '/api/readings/{id}/model', tag: 'readings', summary: 'Fit a posted draft; saves nothing', may: 'catalogue.see', params: idParams, body: modelBody, status: 200, answer: modelAnswer }),
  handIn: operation({ method: 'POST', path: '/api/readings/{id}/hand-in', tag: 'review', summary: 'Ask for review', may: 'reading.handIn', params: idParams, body: handInBody, ifMatch: true, status: 200, answer: stateAnswer, problems: [409, 422] }),
  takeBack: operation({ method: 'POST', path: '/api/readings/{id}/take-back', tag: 'review', summary: 'Take back what was handed in', may: 'reading.takeBack', params: idParams, body: emptyBody, ifMatch: true, status: 200, answer: stateAnswer, problems: [409] }),
  approve: operation({ method: 'POST', path: '/api/readings/{id}/approve', tag: 'review', summary: 'Approve what was handed in', may: 'reading.decide', params: idParams, body: emptyBody, ifMatch: true, status: 200, answer: stateAnswer, problems: [409] }),
  returnReading: operation({ method: 'POST', path: '/api/readings/{id}/return', tag: 'review', summary: 'Return it with a reason', may: 'reading.decide', params: idParams, body: returnBody, ifMatch: true, status: 200, answer: stateAnswer, problems: [409] }),
} as const;

export type OperationName = keyof typeof operations;
